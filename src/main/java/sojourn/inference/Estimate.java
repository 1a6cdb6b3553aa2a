package sojourn.inference;

import java.util.OptionalDouble;
import sojourn.numeric.Check;

/** The result of a statistic: a finite number, or undefined with the reason. */
public sealed interface Estimate {
    /** The number, if there is one. */
    OptionalDouble number();

    /** A result. */
    record Value(double amount) implements Estimate {
        /** Refuses NaN and infinities. */
        public Value {
            Check.finite(amount, "amount");
        }

        @Override
        public OptionalDouble number() {
            return OptionalDouble.of(amount);
        }
    }

    /** No result. {@code because} is a clause in plain words, such as "the values do not vary". */
    record Undefined(Reason reason, String because) implements Estimate {
        @Override
        public OptionalDouble number() {
            return OptionalDouble.empty();
        }
    }

    /** Why a statistic has no value. */
    enum Reason {
        /** Fewer observations than the formula needs. */
        TOO_FEW_OBSERVATIONS,
        /** The standard deviation is below 1e-12 max(1, |mean|). */
        ZERO_VARIANCE,
        /** The quantity under a root or below a fraction line came out at or below 0. */
        NOT_POSITIVE,
        /** The arithmetic left the range of double precision. */
        OUT_OF_RANGE,
        /** The quantity does not exist for what it is asked of, such as the variance of a distribution whose tails are too fat. */
        NOT_APPLICABLE
    }

    /** {@code amount} as a value; a number that is not finite is {@link Reason#OUT_OF_RANGE}. */
    static Estimate of(double amount) {
        return Double.isFinite(amount)
                ? new Value(amount)
                : new Undefined(Reason.OUT_OF_RANGE, "the arithmetic left the range of double precision");
    }

    /** The square root of {@code radicand}, undefined unless it is above 0. */
    static Estimate root(double radicand, String name) {
        return radicand <= 0 ? new Undefined(Reason.NOT_POSITIVE, name + " is not above 0") : of(Math.sqrt(radicand));
    }

    /** Undefined, for want of observations. */
    static Estimate tooFew(int found, int needed) {
        return new Undefined(
                Reason.TOO_FEW_OBSERVATIONS, "the formula needs " + needed + " observations and there are " + found);
    }

    /** Undefined, for want of variation. */
    static Estimate zeroVariance() {
        return new Undefined(Reason.ZERO_VARIANCE, "the values do not vary");
    }
}
