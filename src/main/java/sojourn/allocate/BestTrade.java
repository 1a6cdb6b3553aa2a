package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import sojourn.walk.Forecast;

/** {@link MeanVariance} at work. */
final class BestTrade implements Sizer {
    private static final double PERCENT = 100;

    private final MeanVariance rule;
    private final Optimum optimum;
    private final List<String> assets;

    BestTrade(MeanVariance rule, Optimum optimum, List<String> assets) {
        this.rule = rule;
        this.optimum = optimum;
        this.assets = assets;
    }

    @Override
    public Wish weights(Situation situation, double[] probabilities, Stance lived) {
        Forecast forecast = rule.forecast(situation, probabilities);
        return optimum.of(forecast, rule.risk().aversion(), excess(situation, forecast));
    }

    /** Expected return of the bar over what cash is expected to earn on one, by chosen asset. */
    private double[] excess(Situation situation, Forecast forecast) {
        int[] chosen = optimum.chosen();
        double[] excess = new double[chosen.length];
        for (int i = 0; i < excess.length; i++) {
            excess[i] = forecast.mean(chosen[i]) - situation.known().expectedCashReturn();
        }
        return excess;
    }

    @Override
    public String sentence(Close close) {
        double[] excess = excess(close.situation(), rule.forecast(close.situation(), close.probabilities()));
        double periods = close.situation().known().barLength().periodsPerYear();
        List<String> parts = new ArrayList<>();
        for (int i = 0; i < excess.length; i++) {
            parts.add(rule.among().get(i) + " " + Figure.of(PERCENT * periods * excess[i]) + " %");
        }
        return "forecast over cash, a year: " + String.join(", ", parts) + "; against their risk that asks for "
                + mix(close)
                + close.closeBefore()
                        .map(before -> "; the bar before for " + mix(before))
                        .orElse("");
    }

    private String mix(Close close) {
        return Figure.weights(weights(close), assets, optimum.chosen());
    }
}
