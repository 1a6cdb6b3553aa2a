package sojourn.regime;

import sojourn.numeric.Check;

/** A penalised likelihood to compare numbers of states by, smaller being better; a guide only, since a redundant state breaks its theory. */
public enum InformationCriterion {
    /** -2 l + 2 p. Akaike (1974), IEEE Trans. Autom. Control 19, 716-723. */
    AKAIKE {
        @Override
        public double of(double logLikelihood, int parameters, int observations) {
            return -2 * logLikelihood + 2.0 * parameters;
        }
    },
    /** -2 l + p ln n. Schwarz (1978), Annals of Statistics 6, 461-464. */
    BAYES {
        @Override
        public double of(double logLikelihood, int parameters, int observations) {
            Check.within(observations, 1, Integer.MAX_VALUE, "observations");
            return -2 * logLikelihood + parameters * StrictMath.log(observations);
        }
    };

    /** The criterion of a log-likelihood reached with so many free parameters on so many observations. */
    public abstract double of(double logLikelihood, int parameters, int observations);
}
