package sojourn.numeric;

/**
 * Argument checks for programmers' mistakes: each message holds the name and the value. For one of many values the index comes apart
 * from the name, because putting them together for each of millions that are in order would take longer than looking at them.
 */
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

    /** The same for one of many, told as {@code name} and {@code index}. */
    public static double atLeast(double value, double low, String name, int index) {
        return value >= low && !Double.isInfinite(value) ? value : atLeast(value, low, name + " " + index);
    }

    /** The same for one of many, told as {@code name} and {@code index}. */
    public static double above(double value, double low, String name, int index) {
        return value > low && !Double.isInfinite(value) ? value : above(value, low, name + " " + index);
    }

    /** Returns {@code value} if {@code low <= value <= high}; refuses NaN too. */
    public static double within(double value, double low, double high, String name) {
        if (!(value >= low && value <= high)) {
            throw new IllegalArgumentException(name + " is " + value + ", must lie in [" + low + ", " + high + "]");
        }
        return value;
    }

    /** The same for one of many, told as {@code name} and {@code index}. */
    public static double within(double value, double low, double high, String name, int index) {
        return value >= low && value <= high ? value : within(value, low, high, name + " " + index);
    }

    /** Returns {@code value} if it is finite. */
    public static double finite(double value, String name) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(name + " is " + value + ", must be finite");
        }
        return value;
    }

    /** The same for one of many, told as {@code name} and {@code index}. */
    public static double finite(double value, String name, int index) {
        return Double.isFinite(value) ? value : finite(value, name + " " + index);
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
