package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import sojourn.document.Nearest;
import sojourn.document.Quoted;
import sojourn.market.AssetName;

/**
 * A fault between parts of a strategy file that are each well formed: a rule that names an unknown regime, weights beyond the limits.
 *
 * @param pointer JSON pointer of the place, from the section that the fault belongs to: "/switch/in/stocks"
 * @param at which end of the entry at that place is at fault
 * @param within the character of the text value at that place, counted from 0, that is at fault; 0 for the whole of it
 * @param what what is wrong, with the value
 * @param remedy what to do
 */
public record Misfit(String pointer, At at, int within, String what, String remedy) {
    /** A key or its value. */
    public enum At {
        /** What stands before the colon. */
        KEY,
        /** What stands after it, or an item of a list. */
        VALUE
    }

    /** At the whole of a key or value. */
    public Misfit(String pointer, At at, String what, String remedy) {
        this(pointer, at, 0, what, remedy);
    }

    /** At a value. */
    public Misfit(String pointer, String what, String remedy) {
        this(pointer, At.VALUE, what, remedy);
    }

    /** A name that no asset has. */
    public static Misfit noAsset(String pointer, At at, String name, List<String> assets) {
        return new Misfit(
                pointer,
                at,
                "no asset is called " + Quoted.of(name),
                Nearest.hint(name, assets) + "name one of " + String.join(", ", assets) + ", or add it under prices");
    }

    /** A name that no regime has. */
    public static Misfit noRegime(String pointer, At at, String name, List<String> regimes) {
        return new Misfit(
                pointer,
                at,
                "no regime is called " + Quoted.of(name),
                Nearest.hint(name, regimes) + "name one of " + String.join(", ", regimes)
                        + ", as under regimes, states");
    }

    /** Names among weights that no asset has; {@code cash} is told apart, since it is what weights leave. */
    public static List<Misfit> inWeights(String pointer, Iterable<String> names, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>();
        for (String name : names) {
            String place = RuleKeys.child(pointer, name);
            if (name.equals(AssetName.CASH)) {
                misfits.add(new Misfit(
                        place,
                        At.KEY,
                        "'cash' is no asset of prices",
                        "leave it out: what the weights leave of 1 is cash"));
            } else if (!assets.contains(name)) {
                misfits.add(noAsset(place, At.KEY, name, assets));
            }
        }
        return misfits;
    }
}
