package sojourn.inference;

import sojourn.CheckValues;

/** The series of the NIST sets NumAcc1, NumAcc2 and NumAcc4: written out, or one value followed by a repeated pair. */
final class NumericalAccuracySeries {
    private NumericalAccuracySeries() {}

    static double[] of(CheckValues certified) {
        if (certified.hasInput("x")) {
            return CheckValues.doubles(certified.input("x"));
        }
        double[] pair = CheckValues.doubles(certified.input("pair"));
        double[] series = new double[1 + 2 * certified.input("pair_repeats").asInt()];
        series[0] = certified.input("first").asDouble();
        for (int i = 1; i < series.length; i++) {
            series[i] = pair[(i - 1) % 2];
        }
        return series;
    }
}
