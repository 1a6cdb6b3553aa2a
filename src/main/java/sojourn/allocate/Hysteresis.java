package sojourn.allocate;

/** {@link Switch} at work: state 0 is in, state 1 is out. */
final class Hysteresis implements Mechanism {
    private static final int IN = 0;
    private static final int OUT = 1;

    private final Switch rule;
    private final String who;
    private final int regime;
    private final Weights in;
    private final Weights out;

    Hysteresis(Switch rule, int regime, Weights in, Weights out) {
        this.rule = rule;
        this.who = RuleKeys.prefix(rule) + rule.regime();
        this.regime = regime;
        this.in = in;
        this.out = out;
    }

    @Override
    public Stance live(double[] probabilities, Stance before) {
        double p = probabilities[regime];
        int state = before.lived() == Stance.NONE ? IN : before.lived();
        boolean crosses = state == IN ? p >= rule.leaveAbove() : p <= rule.reEnterBelow();
        int run = crosses ? before.run() + 1 : 0;
        return run >= rule.confirm()
                ? before.living(1 - state, Stance.NONE, 0)
                : before.living(state, crosses ? 1 - state : Stance.NONE, run);
    }

    @Override
    public Weights weights(Situation situation, double[] probabilities, int state, Stance lived) {
        return state == OUT ? out : in;
    }

    @Override
    public Because because(Situation situation, double[] probabilities, Stance before, Stance lived) {
        boolean was = before.lived() == OUT;
        boolean is = lived.lived() == OUT;
        double level = was ? rule.reEnterBelow() : rule.leaveAbove();
        Side side = was ? Side.OUT : Side.IN;
        int run = was != is ? rule.confirm() : lived.run();
        return new Crossing(who, probabilities[regime], level, side, run, rule.confirm());
    }

    @Override
    public String name(int state) {
        return state == OUT ? "out" : "in";
    }

    /** The side that the close before ended on. */
    private enum Side {
        IN("rose to or above", "is at or above", "lies below", "stays in"),
        OUT("fell to or below", "is at or below", "lies above", "stays out");

        private final String crossed;
        private final String beyond;
        private final String within;
        private final String stays;

        Side(String crossed, String beyond, String within, String stays) {
            this.crossed = crossed;
            this.beyond = beyond;
            this.within = within;
            this.stays = stays;
        }
    }

    /** {@code run} closes running beyond the level, {@code confirm} of which change the state. */
    private record Crossing(String who, double p, double level, Side side, int run, int confirm) implements Because {
        @Override
        public String sentence() {
            String figures = Figure.level(level);
            String start = who + " " + Figure.beside(p, level) + " ";
            if (run == 0) {
                return start + side.within + " " + figures + ", " + side.stays;
            }
            if (run < confirm) {
                return start + side.beyond + " " + figures + " for " + run + " of " + confirm + " closes, "
                        + side.stays;
            }
            return start + side.crossed + " " + figures + (confirm == 1 ? "" : " for " + confirm + " closes running");
        }
    }
}
