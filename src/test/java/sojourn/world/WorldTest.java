package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.time.MonthDay;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.document.InputException;

class WorldTest {
    @Test
    void theShippedWorldReadsAsItIsWritten() {
        World world = Worlds.skerry();
        assertThat(world.firstDay()).isEqualTo(LocalDate.of(2001, 1, 1));
        assertThat(world.assetNames()).containsExactly("stocks", "bonds", "gold");
        assertThat(world.stateNames()).containsExactly("calm", "unsettled", "stormy");
        assertThat(world.holidays().days()).containsEntry("Herring Day", MonthDay.of(2, 11));
        assertThat(world.listing("bonds").couponPercentPerYear()).hasValue(3.4);
        assertThat(world.listing("bonds").trading()).isEmpty();
        assertThat(world.state("stormy").stay()).isEqualTo(new Stay(15, 60, 3));
        assertThat(world.state("stormy").move("stocks")).isEqualTo(new Move(-6, 32));
        assertThat(world.fault()).isEmpty();
    }

    @Test
    void aCouponBesideTradingIsRefused() {
        String bad = Worlds.skerryText()
                .replace(
                        "coupon-percent-per-year: 3.4",
                        "coupon-percent-per-year: 3.4\n    trading: {overnight-share: 0.2, typical-volume: 9}");
        assertThatThrownBy(() -> Worlds.read(bad)).hasMessageContaining("an asset with a coupon also has 'trading'");
    }

    @Test
    void aStateWithoutAMoveOfEveryAssetIsRefused() {
        String bad = Worlds.skerryText()
                .replaceFirst("gold: \\{drift-percent-per-year: 5,.*", "# no move of gold")
                .replace("{stocks: {bonds: -0.4, gold: -0.1}, bonds: {gold: 0.25}}", "{stocks: {bonds: -0.4}}");
        assertThatThrownBy(() -> Worlds.read(bad))
                .hasMessageContaining(
                        "state stormy has moves of stocks, bonds, but the assets are stocks, bonds, gold");
    }

    @Test
    void anAssetMayNotTakeTheNameOfAnotherFile() {
        String bad = Worlds.skerryText().replace("gold:", "truth:").replace("gold: ", "truth: ");
        assertThatThrownBy(() -> Worlds.read(bad)).hasMessageContaining("an asset is called 'truth'");
    }

    @Test
    void severalFaultsAreToldInOneGo() {
        String bad = Worlds.skerryText()
                .replace("mean-bars: 60", "mean-bars: 14")
                .replace("Herring Day: 02-11", "Herring Day: 13-11")
                .replace("years: 24", "years: 0");
        assertThatThrownBy(() -> Worlds.read(bad))
                .isInstanceOfSatisfying(
                        InputException.class,
                        refused -> assertThat(refused.problems()).hasSize(3));
    }

    @Test
    void theSchemaSaysWhatIsAccepted() {
        assertThat(World.SHAPE.schema().toString())
                .contains("volatility-percent-per-year", "negative-binomial-shape", "coupon-percent-per-year");
    }

    /** One edit of the shipped world, the file's line at which it must be refused (found by its text), and the words of the refusal. */
    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '"', textBlock = """
            volatility-percent-per-year: 32}             | volatility-percent-per-year: -32}              | stocks: {drift-percent-per-year: -6 | -32
            volatility-percent-per-year: 32}             | volatility-percent-per-year: 0}                | stocks: {drift-percent-per-year: -6 | above 0
            stocks: {bonds: -0.4, gold: -0.1}            | stocks: {bonds: -0.9, gold: 0.9}               | correlations: {stocks: {bonds: -0.9 | contradict each other
            stocks: {bonds: -0.4, gold: -0.1}            | stocks: {bonds: -1.4, gold: -0.1}              | correlations: {stocks: {bonds: -1.4 | -1.4
            stocks: {bonds: -0.4, gold: -0.1}            | stocks: {bonds: -0.4}                          | correlations: {stocks: {bonds: -0.4}| stocks and gold is missing
            then: {calm: 0.3, unsettled: 0.7}            | then: {calm: 0.3, foggy: 0.7}                  | stay: {shortest-bars: 15            | 'foggy', said to follow stormy, is not a state
            then: {calm: 0.3, unsettled: 0.7}            | then: {calm: 0.3, stormy: 0.7}                 | stay: {shortest-bars: 15            | stormy is said to follow itself
            then: {calm: 0.3, unsettled: 0.7}            | then: {calm: 0.3, unsettled: 0.6}              | then: {calm: 0.3, unsettled: 0.6}   | sum to 0.9
            starts-in: calm                              | starts-in: windy                               | starts-in: windy                    | 'windy' is not a state
            first-day: 2001-01-01                        | first-day: 2001-02-30                          | first-day: 2001-02-30               | 2001-02-30
            first-day: 2001-01-01                        | first-day: 1801-01-01                          | first-day: 1801-01-01               | the first day is 1801-01-01
            Herring Day: 02-11                           | Herring Day: 02-30                             | Herring Day: 02-30                  | '02-30' is not a day of the year
            Herring Day: 02-11                           | Herring Day: 11 Feb                            | Herring Day: 11 Feb                 | mm-dd
            mean-bars: 60                                | mean-bars: 14                                  | mean-bars: 14                       | below the shortest stay of 15
            degrees-of-freedom: 6                        | degrees-of-freedom: 2                          | degrees-of-freedom: 2               | 2
            gold: {drift-percent-per-year: 5,            | silver: {drift-percent-per-year: 5,            | correlations: {stocks: {bonds: -0.4 | 'gold' is not an asset
            every-days: 7                                | every-days: 11                                 | every-days: 11                      | 11
            years: 24                                    | yeers: 24                                      | yeers: 24                           | yeers
            """)
    void aBadWorldIsRefusedAtItsPlace(String from, String to, String line, String words) {
        String text = Worlds.skerryText();
        assertThat(text).contains(from);
        String bad = text.replace(from, to);
        int expectedLine = 1
                + (int) bad.substring(0, bad.indexOf(line))
                        .chars()
                        .filter(c -> c == '\n')
                        .count();
        assertThatThrownBy(() -> Worlds.read(bad)).isInstanceOfSatisfying(InputException.class, refused -> {
            assertThat(refused.problems()).hasSize(1);
            assertThat(refused.problems().get(0).toString())
                    .startsWith(Worlds.FILE + ":")
                    .contains(words);
            assertThat(refused.problems().get(0).line()).isEqualTo(expectedLine);
        });
    }
}
