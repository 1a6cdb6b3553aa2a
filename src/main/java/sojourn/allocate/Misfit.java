package sojourn.allocate;

/**
 * A fault between parts of a strategy file that are each well formed: a rule that names an unknown regime, weights beyond the limits.
 *
 * @param pointer JSON pointer of the place, from the section that the fault belongs to: "/switch/in/stocks"
 * @param what what is wrong, with the value
 * @param remedy what to do
 */
public record Misfit(String pointer, String what, String remedy) {}
