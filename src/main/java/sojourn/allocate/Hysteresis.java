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
    public String sentence(Close close) {
        double p = close.probabilities()[regime];
        Side side = close.before().lived() == OUT ? Side.OUT : Side.IN;
        double level = side == Side.OUT ? rule.reEnterBelow() : rule.leaveAbove();
        boolean crosses = side.beyond(p, level);
        boolean changes = crosses && close.lived().run() == 0;
        String start = who + " " + Figure.beside(p, level) + " ";
        if (!crosses) {
            return start + side.within + " " + Figure.level(level) + ", " + side.stays;
        }
        if (!changes) {
            return start + side.stands(p, level) + " for " + close.lived().run() + " of " + rule.confirm() + " closes, "
                    + side.stays;
        }
        boolean moves =
                close.earlier().isPresent() && !side.beyond(close.earlier().get()[regime], level);
        return start
                + (moves ? side.goes(p, level) : side.stands(p, level))
                + (rule.confirm() == 1 ? "" : " for " + rule.confirm() + " closes running")
                + close.earlier()
                        .map(earlier -> "; it was " + Figure.beside(earlier[regime], level) + " the bar before")
                        .orElse("");
    }

    @Override
    public String name(int state) {
        return inWords(state);
    }

    static String inWords(int state) {
        return state == OUT ? "out" : "in";
    }

    /** The side that the close before ended on. */
    private enum Side {
        IN("rose", "above", "lies below", "stays in") {
            @Override
            boolean beyond(double p, double level) {
                return p >= level;
            }
        },
        OUT("fell", "below", "lies above", "stays out") {
            @Override
            boolean beyond(double p, double level) {
                return p <= level;
            }
        };

        private final String moved;
        private final String past;
        private final String within;
        private final String stays;

        Side(String moved, String past, String within, String stays) {
            this.moved = moved;
            this.past = past;
            this.within = within;
            this.stays = stays;
        }

        abstract boolean beyond(double p, double level);

        /** It crossed the level at this close. */
        String goes(double p, double level) {
            return moved + " " + (p == level ? "to" : past) + " " + Figure.level(level);
        }

        /** It lies beyond the level. */
        String stands(double p, double level) {
            return "is " + (p == level ? "at" : past) + " " + Figure.level(level);
        }
    }
}
