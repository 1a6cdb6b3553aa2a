package sojourn.compare;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import sojourn.measure.Measured;
import sojourn.trade.Track;

/**
 * What ran beside a variant, and what could not, each in the order in which it was asked for.
 *
 * @param <K> what yardsticks are told apart by
 * @param tracks those that ran
 * @param absent why the others did not
 */
record Alongside<K>(Map<K, Track> tracks, Map<K, Measured.Undefined> absent) {
    /** Copies its maps, in order. */
    Alongside {
        tracks = Collections.unmodifiableMap(new LinkedHashMap<>(tracks));
        absent = Collections.unmodifiableMap(new LinkedHashMap<>(absent));
    }

    static <K> Alongside<K> none() {
        return new Alongside<>(Map.of(), Map.of());
    }

    /** And one that ran; {@code otherwise} says why if it did not. */
    Alongside<K> and(K key, Optional<Track> track, Measured.Undefined otherwise) {
        return track.map(ran -> and(key, ran)).orElseGet(() -> without(key, otherwise));
    }

    /** And one that ran. */
    Alongside<K> and(K key, Track track) {
        Map<K, Track> more = new LinkedHashMap<>(tracks);
        more.put(key, track);
        return new Alongside<>(more, absent);
    }

    /** And others. */
    Alongside<K> and(Alongside<K> others) {
        Map<K, Track> more = new LinkedHashMap<>(tracks);
        Map<K, Measured.Undefined> fewer = new LinkedHashMap<>(absent);
        more.putAll(others.tracks());
        fewer.putAll(others.absent());
        return new Alongside<>(more, fewer);
    }

    /** And one that did not. */
    Alongside<K> without(K key, Measured.Undefined because) {
        Map<K, Measured.Undefined> more = new LinkedHashMap<>(absent);
        more.put(key, because);
        return new Alongside<>(tracks, more);
    }
}
