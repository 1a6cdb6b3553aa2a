package sojourn.document.shape;

import java.util.List;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Place;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;

/** That a key of a map is meant only beside some words of another key of the same map. */
public record Belonging(Field<?> other, List<String> words) {
    public Belonging {
        if (other.defaultWord().isEmpty()) {
            throw new IllegalArgumentException("'" + other.key() + "' has no word for a default");
        }
        words = List.copyOf(words);
    }

    /** The word that a node is, if it is one. */
    public static Optional<String> word(Node node) {
        return node instanceof ScalarNode scalar ? Optional.of(scalar.text()) : Optional.empty();
    }

    /** Whether the other key has one of the words; true as well for a value at fault, which is told of elsewhere. */
    public boolean holds(MapNode map) {
        return decides(map).map(words::contains).orElse(true);
    }

    private Optional<String> decides(MapNode map) {
        Optional<Node> written = map.get(other.key());
        return written.isEmpty()
                ? other.defaultWord()
                : written.filter(other::reads).flatMap(Belonging::word);
    }

    /** Refuses {@code own} where it is written and the other key has another word. */
    public boolean check(String own, MapNode map, Problems problems) {
        Optional<Place> place = map.keyPlace(own);
        Optional<String> word = decides(map).filter(w -> !words.contains(w));
        if (place.isEmpty() || word.isEmpty()) {
            return true;
        }
        problems.add(
                place.get(),
                "'" + own + "' belongs to " + other.key() + ": " + String.join(" or ", words) + ", not to "
                        + word.get(),
                "leave it out, or change '" + other.key() + "'");
        return false;
    }
}
