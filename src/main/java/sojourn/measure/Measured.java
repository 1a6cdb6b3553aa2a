package sojourn.measure;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.inference.Estimate;
import sojourn.numeric.Check;

/** What a measure came to: a finite number, perhaps with an interval, or undefined with the reason. Never NaN, never infinite. */
public sealed interface Measured {
    /** The number, if there is one. */
    OptionalDouble number();

    /** A number. */
    record Value(double amount, Optional<Interval> interval) implements Measured {
        /** Refuses NaN and infinities; turns -0.0 into 0.0. */
        public Value {
            Check.finite(amount, "amount");
            amount = amount + 0.0;
        }

        @Override
        public OptionalDouble number() {
            return OptionalDouble.of(amount);
        }
    }

    /** No number. {@code because} is a clause in plain words, such as "wealth never fell below an earlier peak". */
    record Undefined(Reason reason, String because) implements Measured {
        @Override
        public OptionalDouble number() {
            return OptionalDouble.empty();
        }
    }

    /** The range in which the true value plausibly lies, and in {@code definition} what that means. */
    record Interval(double low, double high, String definition) {
        /** Refuses bounds that are not finite or not in order. */
        public Interval {
            Check.finite(low, "low");
            Check.atLeast(high, low, "high");
        }
    }

    /** Why a measure has no number. */
    enum Reason {
        /** The returns do not vary. */
        ZERO_VARIANCE,
        /** Fewer bars than the formula needs. */
        TOO_FEW_BARS,
        /** The window is shorter than 365 calendar days, so nothing is annualised. */
        UNDER_ONE_YEAR,
        /** No return fell short of the hurdle. */
        NO_DOWNSIDE,
        /** Wealth never fell below an earlier peak. */
        NO_DRAWDOWN,
        /** Wealth reached 0 inside the window. */
        RUIN,
        /** No whole calendar month or year lies in the window. */
        NO_WHOLE_PERIOD,
        /** There is one regime alone, and nothing to tell apart. */
        ONE_REGIME,
        /** Nothing ever changes that could have changed at other times. */
        NO_CHANGE,
        /** The path does not record what the measure is made of. */
        NOT_RECORDED,
        /** The approximation does not hold for moments like these. */
        NOT_APPLICABLE,
        /** A quantity that must be above 0 came out at or below it. */
        NOT_POSITIVE,
        /** The arithmetic left the range of double precision. */
        OUT_OF_RANGE
    }

    /** {@code amount} as a number without an interval; one that is not finite is {@link Reason#OUT_OF_RANGE}. */
    static Measured of(double amount) {
        return from(Estimate.of(amount));
    }

    /** {@code amount} with its interval. */
    static Measured of(double amount, Interval interval) {
        return new Value(amount, Optional.of(interval));
    }

    /** Undefined, with the reason. */
    static Measured undefined(Reason reason, String because) {
        return new Undefined(reason, because);
    }

    /** Undefined, for want of bars. */
    static Measured tooFew(int found, int needed) {
        return undefined(Reason.TOO_FEW_BARS, "it needs " + needed + " bars and there are " + found);
    }

    /** A statistic as a measure. */
    static Measured from(Estimate estimate) {
        if (estimate instanceof Estimate.Undefined none) {
            return undefined(from(none.reason()), none.because());
        }
        return new Value(estimate.number().orElseThrow(), Optional.empty());
    }

    /** This number times {@code factor}, with no interval; undefined stays as it is. */
    default Measured times(double factor) {
        return number().isPresent() ? of(number().getAsDouble() * factor) : this;
    }

    /** This number less another, with no interval; the first that is undefined, if one is. */
    default Measured minus(Measured other) {
        if (number().isEmpty()) {
            return this;
        }
        return other.number().isPresent()
                ? of(number().getAsDouble() - other.number().getAsDouble())
                : other;
    }

    private static Reason from(Estimate.Reason reason) {
        return switch (reason) {
            case TOO_FEW_OBSERVATIONS -> Reason.TOO_FEW_BARS;
            case ZERO_VARIANCE -> Reason.ZERO_VARIANCE;
            case NOT_POSITIVE -> Reason.NOT_POSITIVE;
            case OUT_OF_RANGE -> Reason.OUT_OF_RANGE;
            case NOT_APPLICABLE -> Reason.NOT_APPLICABLE;
        };
    }
}
