package sojourn.walk;

import java.util.List;

/** Puts the regimes' names where a fit's events have their indices: {@code near-tie {0}/{1}} becomes {@code near-tie calm/stormy}. */
final class EventWords {
    private EventWords() {}

    static List<String> named(List<String> events, List<String> regimes) {
        return events.stream().map(event -> named(event, regimes)).toList();
    }

    /** An explanation with the regimes' names in place of {@code {k}}, and the observations' in place of {@code [j]}. */
    static String named(String explanation, List<String> regimes, List<Observation> observed) {
        String text = named(explanation, regimes);
        for (int j = 0; j < observed.size(); j++) {
            text = text.replace("[" + j + "]", observed.get(j).inWords());
        }
        return text;
    }

    private static String named(String event, List<String> regimes) {
        String text = event;
        for (int k = 0; k < regimes.size(); k++) {
            text = text.replace("{" + k + "}", regimes.get(k));
        }
        return text;
    }
}
