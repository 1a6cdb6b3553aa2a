package sojourn.numeric;

/** Argument checks for programmers' mistakes: each message holds the name and the value. */
public final class Check {
    private Check() {}

    /** Returns {@code value} if it is finite and at least {@code low}; refuses NaN too. */
    public static double atLeast(double value, double low, String name) {
        if (!(value >= low) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(name + " is " + value + ", must be at least " + low);
        }
        return value;
    }

    /** Returns {@code value} if it is finite and above {@code low}; refuses NaN too. */
    public static double above(double value, double low, String name) {
        if (!(value > low) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(name + " is " + value + ", must be above " + low);
        }
        return value;
    }

    /** Returns {@code value} if {@code low <= value <= high}; refuses NaN too. */
    public static double within(double value, double low, double high, String name) {
        if (!(value >= low && value <= high)) {
            throw new IllegalArgumentException(name + " is " + value + ", must lie in [" + low + ", " + high + "]");
        }
        return value;
    }

    /** Returns {@code value} if it is finite. */
    public static double finite(double value, String name) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(name + " is " + value + ", must be finite");
        }
        return value;
    }

    /** Returns {@code value} if {@code low <= value <= high}. */
    public static int within(int value, int low, int high, String name) {
        if (value < low || value > high) {
            throw new IllegalArgumentException(name + " is " + value + ", must lie in [" + low + ", " + high + "]");
        }
        return value;
    }

    /** Refuses with {@code message} unless {@code condition} holds. */
    public static void that(boolean condition, String message) {
        if (!condition) {
            throw new IllegalArgumentException(message);
        }
    }
}
