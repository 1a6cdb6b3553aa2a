package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class NearestTest {
    private static final List<String> KNOWN = List.of("leave-above", "re-enter-below", "regime", "in", "out");

    @Test
    void oneOrTwoSlipsAreForgiven() {
        assertThat(Nearest.to("leave-abov", KNOWN)).contains("leave-above");
        assertThat(Nearest.to("lave-abvoe", KNOWN)).contains("leave-above");
        assertThat(Nearest.to("Regime", KNOWN)).contains("regime");
        assertThat(Nearest.to("regmie", KNOWN)).contains("regime");
    }

    @Test
    void aThirdOfALongWordIsForgiven() {
        assertThat(Nearest.to("re_entry_below", KNOWN)).contains("re-enter-below");
        assertThat(Nearest.to("re_entry_under", KNOWN)).isEmpty();
    }

    @Test
    void wordsWithNothingInCommonAreNotSuggested() {
        assertThat(Nearest.to("xy", KNOWN)).isEmpty();
        assertThat(Nearest.to("colour", KNOWN)).isEmpty();
        assertThat(Nearest.to("", KNOWN)).isEmpty();
        assertThat(Nearest.to("r".repeat(1_000_000), KNOWN)).isEmpty();
    }

    @Test
    void theOnlyWordWithItAsAPartIsMeant() {
        List<String> costs = List.of("commission-bps", "half-spread-bps");
        assertThat(Nearest.to("commission", costs)).contains("commission-bps");
        assertThat(Nearest.to("half_spread", costs)).contains("half-spread-bps");
        assertThat(Nearest.to("Spread", costs)).contains("half-spread-bps");
        assertThat(Nearest.to("bps", costs)).as("of two").isEmpty();
        assertThat(Nearest.to("missi", costs)).as("no whole word").isEmpty();
        assertThat(Nearest.to("re", KNOWN)).as("too short to tell").isEmpty();
    }

    @Test
    void theHintNamesTheNearestOrIsEmpty() {
        assertThat(Nearest.hint("regmie", KNOWN)).isEqualTo("did you mean 'regime'? ");
        assertThat(Nearest.hint("colour", KNOWN)).isEmpty();
    }

    @Test
    void theFirstOfEqualsIsTaken() {
        assertThat(Nearest.to("bat", List.of("cat", "bar"))).contains("cat");
    }
}
