package sojourn.evidence;

import sojourn.inference.Moments;

/**
 * What a forecast h of a squared return r^2 costs. Both rank forecasts of a variance rightly although r^2 is but a noisy witness of it: Patton (2011), J.
 * Econometrics 160, 246-256.
 */
public enum Loss {
    /** ln h + r^2 / h: quasi-likelihood; a forecast too low costs more than one too high. */
    QLIKE {
        @Override
        double of(double square, double forecast) {
            return StrictMath.log(forecast) + square / forecast;
        }
    },
    /** (r^2 - h)^2 in units of the squared mean of r^2: a few stormy bars decide it. */
    SQUARED_ERROR {
        @Override
        double of(double square, double forecast) {
            return (square - forecast) * (square - forecast);
        }
    };

    abstract double of(double square, double forecast);

    /** On each of some bars. None is modified. */
    double[] of(double[] squares, double[] forecasts) {
        double unit = this == SQUARED_ERROR ? Moments.of(squares).mean() : 1;
        double[] losses = new double[squares.length];
        for (int t = 0; t < losses.length; t++) {
            losses[t] = unit > 0 ? of(squares[t] / unit, forecasts[t] / unit) : 0;
        }
        return losses;
    }
}
