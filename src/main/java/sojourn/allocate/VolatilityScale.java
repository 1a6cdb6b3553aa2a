package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.walk.Forecast;

/** {@link VolatilityTarget} at work. */
final class VolatilityScale implements Sizer {
    private static final double PERCENT = 100;

    private final VolatilityTarget rule;
    private final List<String> assets;
    private final Weights mix;

    VolatilityScale(VolatilityTarget rule, List<String> assets) {
        this.rule = rule;
        this.assets = assets;
        this.mix = Weights.named(rule.mix(), assets);
    }

    @Override
    public Wish weights(Situation situation, double[] probabilities, Stance lived) {
        double[] volatilities = volatilities(situation, probabilities);
        double[] weights = new double[assets.size()];
        for (int i = 0; i < weights.length; i++) {
            weights[i] = scale(volatilities[i]) * mix.at(i);
        }
        return Weights.of(weights);
    }

    /** min(c, v / volatility); the cap without volatility. Dividing first could overflow, so the cap is asked for first. */
    private double scale(double volatility) {
        double level = rule.percentPerYear() / PERCENT;
        return volatility * rule.atMost() <= level ? rule.atMost() : level / volatility;
    }

    /** The volatility per year that scales each asset: its own, or that of the whole mix. */
    private double[] volatilities(Situation situation, double[] probabilities) {
        Forecast forecast = rule.forecast(situation, probabilities);
        double periods = situation.known().barLength().periodsPerYear();
        double[] volatilities = new double[assets.size()];
        double ofMix = Math.sqrt(periods * variance(forecast));
        for (int i = 0; i < volatilities.length; i++) {
            volatilities[i] = rule.together() == VolatilityTarget.Together.MIX
                    ? ofMix
                    : Math.sqrt(periods * forecast.covariance(i, i));
        }
        return volatilities;
    }

    /** m' Cov m; at least 0, which rounding may miss. */
    private double variance(Forecast forecast) {
        double variance = 0;
        for (int i = 0; i < assets.size(); i++) {
            for (int j = 0; j < assets.size(); j++) {
                variance += mix.at(i) * mix.at(j) * forecast.covariance(i, j);
            }
        }
        return Math.max(variance, 0);
    }

    @Override
    public String sentence(Close close) {
        double[] volatilities = volatilities(close.situation(), close.probabilities());
        Optional<double[]> earlier =
                close.closeBefore().map(before -> volatilities(before.situation(), before.probabilities()));
        List<String> parts = new ArrayList<>();
        for (int i = 0; i < volatilities.length; i++) {
            if (mix.at(i) != 0) {
                parts.add(part(i, volatilities[i], earlier));
            }
        }
        return "forecast volatility of "
                + String.join("; of ", parts.stream().distinct().toList()) + "; aimed at "
                + Figure.written(rule.percentPerYear()) + " %";
    }

    private String part(int asset, double volatility, Optional<double[]> earlier) {
        String who = rule.together() == VolatilityTarget.Together.MIX ? "the mix" : assets.get(asset);
        String was = earlier.map(before -> " (the bar before " + Figure.of(PERCENT * before[asset]) + " %)")
                .orElse("");
        return who + " " + Figure.of(PERCENT * volatility) + " % a year" + was + ", so " + Figure.of(scale(volatility))
                + " of it" + (scale(volatility) == rule.atMost() ? ", the most allowed" : "");
    }
}
