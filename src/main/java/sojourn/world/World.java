package sojourn.world;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * A stated world: everything that decides what an invented market looks like.
 *
 * @param name what the world is called
 * @param filePrefix what the names of its files begin with
 * @param seed the master seed
 * @param firstDay the first calendar day
 * @param years how many years it lasts from there
 * @param barsPerYear by how many bars figures per year are divided
 * @param holidays days on which nothing trades, besides Saturdays and Sundays
 * @param assets how each asset is quoted
 * @param bills the bill rate
 * @param startsIn the state whose stay begins on the first trading day
 * @param states the hidden states, in the order written
 */
public record World(
        String name,
        String filePrefix,
        long seed,
        LocalDate firstDay,
        int years,
        int barsPerYear,
        Holidays holidays,
        Map<String, Listing> assets,
        Bills bills,
        String startsIn,
        Map<String, HiddenState> states) {
    private static final LocalDate EARLIEST = LocalDate.of(1900, 1, 1);
    private static final LocalDate LATEST = LocalDate.of(2200, 1, 1);

    private static final Field<String> NAME = Field.required("world", Shapes.text(), "what the world is called");
    private static final Field<String> FILE_PREFIX = Field.required(
            "file-prefix",
            Shapes.textLike("[a-z][a-z0-9-]*", "lower-case letters, digits and hyphens"),
            "what the names of the files begin with");
    private static final Field<Long> SEED =
            Field.required("seed", Shapes.longInteger(), "the same seed gives the same files, to the byte");
    private static final Field<LocalDate> FIRST_DAY =
            Field.required("first-day", Shapes.date().refuse(World::dayFault), "the first calendar day, yyyy-mm-dd");
    private static final Field<Integer> YEARS =
            Field.required("years", Shapes.integer().atLeast(1).atMost(100), "years from the first day on");
    private static final Field<Integer> BARS_PER_YEAR = Field.defaulted(
            "bars-per-year",
            Shapes.integer().atLeast(1).atMost(366),
            "252",
            "by how many bars drifts per year are divided (volatilities: by its square root)");
    private static final Field<Optional<Holidays>> HOLIDAYS = Field.maybe(
            "holidays", Holidays.SHAPE, "days of the year on which nothing trades, as mm-dd; weekends are always off");
    private static final Field<Map<String, Listing>> ASSETS =
            Field.required("assets", Shapes.named(Listing.NAME, Listing.SHAPE), "how each asset is quoted");
    private static final Field<Bills> BILLS = Field.required("bills", Bills.SHAPE, "the bill rate");
    private static final Field<String> STARTS_IN =
            Field.required("starts-in", Listing.NAME, "the state whose stay begins on the first trading day");
    private static final Field<Map<String, HiddenState>> STATES = Field.required(
            "states",
            Shapes.named(Listing.NAME, HiddenState.SHAPE).refuse(World::successorFault),
            "the hidden states, by name");

    /** Reads a world file. */
    public static final Shape<World> SHAPE = Shapes.object(
                    "world",
                    f -> new World(
                            f.get(NAME),
                            f.get(FILE_PREFIX),
                            f.get(SEED),
                            f.get(FIRST_DAY),
                            f.get(YEARS),
                            f.get(BARS_PER_YEAR),
                            f.get(HOLIDAYS).orElse(Holidays.none()),
                            f.get(ASSETS),
                            f.get(BILLS),
                            f.get(STARTS_IN),
                            f.get(STATES)),
                    NAME,
                    FILE_PREFIX,
                    SEED,
                    FIRST_DAY,
                    YEARS,
                    BARS_PER_YEAR,
                    HOLIDAYS,
                    ASSETS,
                    BILLS,
                    STARTS_IN,
                    STATES)
            .refuse(World::startFault)
            .refuse(World::assetNameFault)
            .refuse(World::moveFault);

    /** Copies the maps and checks each number's bounds; {@link #fault} says whether the parts fit together. */
    public World {
        Check.within(years, 1, 100, "years");
        Check.within(barsPerYear, 1, 366, "barsPerYear");
        assets = Collections.unmodifiableMap(new LinkedHashMap<>(assets));
        states = Collections.unmodifiableMap(new LinkedHashMap<>(states));
    }

    /** The same world with another seed. */
    public World withSeed(long other) {
        return new World(
                name, filePrefix, other, firstDay, years, barsPerYear, holidays, assets, bills, startsIn, states);
    }

    /** The same world, lasting longer or shorter; the shorter is the beginning of the longer. */
    public World withYears(int other) {
        return new World(
                name, filePrefix, seed, firstDay, other, barsPerYear, holidays, assets, bills, startsIn, states);
    }

    /** The names of the assets, in the order written. */
    public List<String> assetNames() {
        return List.copyOf(assets.keySet());
    }

    /** The names of the states, in the order written. */
    public List<String> stateNames() {
        return List.copyOf(states.keySet());
    }

    /** The state called {@code name}. */
    HiddenState state(String name) {
        return Optional.ofNullable(states.get(name))
                .orElseThrow(() -> new IllegalArgumentException("no state is called " + name));
    }

    /** How {@code asset} is quoted. */
    Listing listing(String asset) {
        return Optional.ofNullable(assets.get(asset))
                .orElseThrow(() -> new IllegalArgumentException("no asset is called " + asset));
    }

    /** The first fault of a world that was not read from a file, where every fault would have been refused. */
    Optional<Refusal> fault() {
        List<Optional<Refusal>> faults = new ArrayList<>(List.of(
                dayFault(firstDay), successorFault(states), startFault(this), assetNameFault(this), moveFault(this)));
        assets.values().forEach(asset -> faults.add(asset.fault()));
        for (HiddenState state : states.values()) {
            faults.add(state.stay().fault());
            faults.add(state.thenFault());
            faults.add(state.correlations().fault(assetNames()));
        }
        return faults.stream().flatMap(Optional::stream).findFirst();
    }

    private static Optional<Refusal> dayFault(LocalDate day) {
        return day.isBefore(EARLIEST) || day.isAfter(LATEST)
                ? Optional.of(new Refusal("", "the first day is " + day, "give a day from 1900-01-01 to 2200-01-01"))
                : Optional.empty();
    }

    private static Optional<Refusal> successorFault(Map<String, HiddenState> states) {
        for (Map.Entry<String, HiddenState> state : states.entrySet()) {
            for (String next : state.getValue().then().keySet()) {
                if (!states.containsKey(next)) {
                    return Optional.of(new Refusal(
                            state.getKey(),
                            "'" + next + "', said to follow " + state.getKey() + ", is not a state",
                            "name one of " + String.join(", ", states.keySet())));
                }
                if (next.equals(state.getKey())) {
                    return Optional.of(new Refusal(
                            state.getKey(),
                            state.getKey() + " is said to follow itself",
                            "lengthen its stay instead; 'then' names other states only"));
                }
            }
        }
        return Optional.empty();
    }

    private static Optional<Refusal> startFault(World world) {
        return world.states.containsKey(world.startsIn)
                ? Optional.empty()
                : Optional.of(new Refusal(
                        "starts-in",
                        "'" + world.startsIn + "' is not a state",
                        "name one of " + String.join(", ", world.states.keySet())));
    }

    private static Optional<Refusal> assetNameFault(World world) {
        return List.of("bills", "cash", "truth").stream()
                .filter(world.assets::containsKey)
                .findFirst()
                .map(taken -> new Refusal(
                        "assets", "an asset is called '" + taken + "'", "choose another name, this one is taken"));
    }

    private static Optional<Refusal> moveFault(World world) {
        for (Map.Entry<String, HiddenState> state : world.states.entrySet()) {
            Set<String> moving = state.getValue().moves().keySet();
            if (!moving.equals(world.assets.keySet())) {
                return Optional.of(new Refusal(
                        "states",
                        "state " + state.getKey() + " has moves of " + String.join(", ", moving)
                                + ", but the assets are " + String.join(", ", world.assets.keySet()),
                        "give every state a move of every asset"));
            }
        }
        return Optional.empty();
    }
}
