package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

class SpellsTest {
    private static int[] states(String text) {
        return text.chars().map(c -> c - '0').toArray();
    }

    private static String text(int[] states) {
        StringBuilder text = new StringBuilder();
        Arrays.stream(states).forEach(text::append);
        return text.toString();
    }

    /** Complete: out 2, in 1, out 1, in 3, out 4; in any order of in (2) and out (6), 12 in all, each as likely (by hand). */
    @Test
    void everyOrderOfCompleteSpellsIsAsLikely() {
        Spells spells = Spells.of(states("00" + "11" + "0" + "1" + "000" + "1111" + "00"));
        assertThat(text(spells.shuffled(RandomStream.of(1, "one")))).hasSize(15);
        assertThat(spells.complete(0)).isEqualTo(2);
        assertThat(spells.complete(1)).isEqualTo(3);
        int draws = 24_000;
        Map<String, Integer> counts = new TreeMap<>();
        for (int i = 0; i < draws; i++) {
            String drawn = text(spells.shuffled(RandomStream.of(7, "spells", Integer.toString(i))));
            assertThat(drawn).startsWith("001").endsWith("100");
            counts.merge(drawn, 1, Integer::sum);
        }
        assertThat(counts).hasSize(12);
        double expected = draws / 12.0;
        double tolerance = 5 * Math.sqrt(expected); // five standard deviations of a count
        assertThat(counts.values())
                .allSatisfy(count -> assertThat((double) count).isCloseTo(expected, within(tolerance)));
        assertThat(counts.keySet()).allSatisfy(drawn -> {
            assertThat(drawn.chars().filter(c -> c == '1').count()).isEqualTo(7);
            assertThat(drawn.split("1+")).containsExactlyInAnyOrder("00", "0", "000", "00");
        });
    }

    @Test
    void spellsThatTheEndsCutOffStayAndOneOfAKindHasOneOrder() {
        assertThat(Spells.of(states("0")).canBeShuffled()).isFalse();
        assertThat(Spells.of(states("0011")).canBeShuffled()).isFalse();
        assertThat(Spells.of(states("0010110")).canBeShuffled()).isTrue();
        Spells one = Spells.of(states("110001"));
        assertThat(one.canBeShuffled()).isFalse();
        assertThat(text(one.shuffled(RandomStream.of(3, "any")))).isEqualTo("110001");
    }
}
