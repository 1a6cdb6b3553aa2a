package sojourn.measure;

/** Which numbers of a measure are to be preferred, all else equal. */
public enum Direction {
    /** The higher, the better. */
    HIGHER,
    /** The lower, the better. */
    LOWER,
    /** Neither end is better in itself. */
    NEITHER
}
