package sojourn.job;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.stream.Collectors;

/** A strategy file: a switch between two regimes of one asset, whose sections a test replaces. */
final class StrategyText {
    static final String SWITCH = "{switch: {regime: stormy, leave-above: 0.6, re-enter-below: 0.4,"
            + " in: {stocks: 1.0}, out: {stocks: 0.2}}}";
    static final String ALWAYS_FULL = "{table: {weights: {only: {stocks: 1.0}}}}";
    static final String ONE_REGIME = "{model: one-regime, observe: [{log-return: stocks}], states: [only]}";

    private final Map<String, String> sections;

    private StrategyText(Map<String, String> sections) {
        this.sections = sections;
    }

    static StrategyText named(String name) {
        Map<String, String> sections = new LinkedHashMap<>();
        sections.put("strategy", name);
        sections.put("prices", "{stocks: {csv: stocks.csv}}");
        sections.put("cash", "{percent-per-year: 2}");
        sections.put("regimes", "{observe: [{log-return: stocks}], states: [calm, stormy]}");
        sections.put("refit", "{first-fit-after: 200, every: 100, starts: 1, seed: 7}");
        sections.put("allocate", SWITCH);
        sections.put("trade", "{costs: {commission-bps: 5, half-spread-bps: 5}}");
        sections.put("judge", "{buy-and-hold: {stocks: 1.0}}");
        return new StrategyText(sections);
    }

    /** Holds stocks whatever happens: one regime, weight 1. */
    static StrategyText alwaysFull(String name) {
        return named(name).with("regimes", ONE_REGIME).with("allocate", ALWAYS_FULL);
    }

    StrategyText with(String section, String yaml) {
        Map<String, String> changed = new LinkedHashMap<>(sections);
        changed.put(section, yaml);
        return new StrategyText(changed);
    }

    String yaml() {
        return sections.entrySet().stream()
                .map(section -> section.getKey() + ": " + section.getValue() + "\n")
                .collect(Collectors.joining());
    }
}
