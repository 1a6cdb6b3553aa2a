package sojourn.regime;

/**
 * A prior on the parameters of a standardised window. Each row of the transition matrix is Dirichlet with alpha_ij = 1 +
 * {@code everyStep} + {@code stay} 1{i=j}, each variance v_k inverse gamma with shape a and scale b, so that, constants dropped, the
 * log density is sum (alpha_ij - 1) ln A_ij - sum_k ((a + 1) ln v_k + b / v_k). Shape -1 with scale 0 is flat. Means and the
 * initial distribution have no prior.
 *
 * @param everyStep steps from each state to each other and itself that count as seen beforehand
 * @param stay further steps from each state to itself
 * @param shape a of the variances
 * @param scale b of the variances, in the window's unit
 */
record PriorDensity(double everyStep, double stay, double shape, double scale) {
    /** The log density at those parameters of a chain, constants dropped; minus infinity where a step believed in is impossible. */
    double logAt(Parameters p) {
        double sum = 0;
        for (int i = 0; i < p.states(); i++) {
            for (int j = 0; j < p.states(); j++) {
                double steps = steps(i, j);
                sum += steps > 0 ? steps * StrictMath.log(p.at(p.transition(i, j))) : 0;
            }
        }
        for (int k = 0; k < p.states(); k++) {
            double variance = p.at(p.variance(k));
            sum -= (shape + 1) * StrictMath.log(variance) + scale / variance;
        }
        return sum;
    }

    /** The expected sums with the steps that count as seen; the argument is not modified. */
    ExpectedSums added(ExpectedSums sums) {
        int states = sums.count.length;
        ExpectedSums result = sums.ordered(Roles.asTheyStand(states));
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                result.transitions[i * states + j] += steps(i, j);
            }
        }
        return result;
    }

    /** The variance that maximises the expected log posterior, of {@code count} observations with that mean square. */
    double variance(double count, double meanSquare) {
        return (count * meanSquare + 2 * scale) / (count + 2 * shape + 2);
    }

    private double steps(int i, int j) {
        return everyStep + (i == j ? stay : 0);
    }
}
