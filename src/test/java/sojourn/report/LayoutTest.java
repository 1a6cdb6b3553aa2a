package sojourn.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.measure.Measured;

/** Layout of tables and paragraphs: widths, alignment, numbers as people read them. */
class LayoutTest {
    @Test
    void aTableIsNeverWiderThanATerminal() {
        Grid grid = new Grid(List.of("name", "a", "a"));
        grid.add(List.of("n".repeat(90), "-1234567.89 %", "x"));
        grid.add(List.of("short", "1", "2"));
        assertThat(grid.text().lines()).hasSize(4).allMatch(line -> line.length() <= Lines.WIDTH);
        assertThat(grid.text()).contains("…  -1234567.89 %").contains("short");
    }

    @Test
    void columnsAreAsWideAsTheyNeedAndNumbersFlushRight() {
        Grid grid = new Grid(List.of("", "growth"));
        grid.add(List.of("one", "1.0 %"));
        grid.add(List.of("three", "-10.0 %"));
        assertThat(grid.text()).isEqualTo("        growth\n-----  -------\none      1.0 %\nthree  -10.0 %\n");
    }

    @Test
    void longTextIsWrappedAtSpacesUnderItsHead() {
        String text = Lines.after("  Head ", "word ".repeat(60), 7);
        assertThat(text.lines()).hasSizeGreaterThan(2).allMatch(line -> line.length() <= Lines.WIDTH);
        assertThat(text.lines().skip(1)).allMatch(line -> line.startsWith("       word"));
        assertThat(text.split("\\s+", -1)).filteredOn("word"::equals).hasSize(60);
    }

    @Test
    void aZeroThatRoundingLeftAMinusSignLosesIt() {
        assertThat(Figures.percent(Measured.of(-0.0001))).isEqualTo("0.0 %");
        assertThat(Figures.ratio(Measured.of(-0.001))).isEqualTo("0.00");
        assertThat(Figures.percent(Measured.of(-0.0006))).isEqualTo("-0.1 %");
        assertThat(Figures.percent(Measured.undefined(Measured.Reason.RUIN, "wealth is gone")))
                .isEqualTo("n/a");
    }

    @Test
    void weightsReadAsSharesWithTheRestInCash() {
        Map<String, Double> weights = new LinkedHashMap<>();
        weights.put("stocks", 0.6);
        weights.put("bonds", 0.325);
        weights.put("gold", 0.0);
        assertThat(RuleText.weights(weights)).isEqualTo("60 % stocks, 32.5 % bonds, 7.5 % cash");
        assertThat(RuleText.weights(Map.of("stocks", 0.0))).isEqualTo("100 % cash");
        assertThat(RuleText.weights(Map.of("stocks", 1.0))).isEqualTo("100 % stocks");
    }
}
