package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Probabilities that were computed elsewhere: which of them count at which close, and what is refused. */
class GivenFileTest {
    private static final String HEADER = "date,calm,stormy,known\n";
    private static final String PRICES = """
            date,close
            2020-01-06,1
            2020-01-07,2
            2020-01-08,3
            2020-01-09,4
            2020-01-10,5
            2020-01-13,6
            2020-01-14,7
            """;

    @TempDir
    Path folder = Path.of("");

    @Test
    void aRowCountsFromTheFirstCloseOnOrAfterTheDayItBecameKnownAndNotFromItsOwn() {
        Market market = market("2020-01-06,0.9,0.1,2020-01-08\n2020-01-08,0.2,0.8,2020-01-11\n");
        // the 11th is a Saturday: known at the close of Monday the 13th
        assertThat(stormy(market)).containsExactly(-1.0, -1.0, 0.1, 0.1, 0.1, 0.8, 0.8);
    }

    @Test
    void aRowKnownOnItsOwnDayCountsAtThatClose() {
        assertThat(stormy(market("2020-01-07,0.5,0.5,2020-01-07\n")))
                .containsExactly(-1.0, 0.5, 0.5, 0.5, 0.5, 0.5, 0.5);
    }

    @Test
    void ofRowsKnownOnOneDayThatOfTheLatestDateCounts() {
        Market market = market("2020-01-06,0.9,0.1,2020-01-09\n2020-01-07,0.6,0.4,2020-01-09\n");
        assertThat(stormy(market)).containsExactly(-1.0, -1.0, -1.0, 0.4, 0.4, 0.4, 0.4);
        assertThat(findings(market)).isEmpty();
    }

    @Test
    void theRowThatBecameKnownLastCountsEvenIfItIsOfAnEarlierDateAndThatIsTold() {
        Market market = market("2020-01-06,0.9,0.1,2020-01-10\n2020-01-07,0.6,0.4,2020-01-08\n");
        assertThat(stormy(market)).containsExactly(-1.0, -1.0, 0.4, 0.4, 0.1, 0.1, 0.1);
        assertThat(findings(market))
                .singleElement()
                .asString()
                .startsWith("given.csv:3: 1 row became known before a row of an earlier date did")
                .contains("2020-01-07");
    }

    @Test
    void rowsKnownBeforeTheFirstCloseAndAfterTheLastAreNoFault() {
        Market market = market("2019-12-30,0.9,0.1,2020-01-02\n2020-01-13,0.6,0.4,2020-02-01\n");
        assertThat(stormy(market)).containsExactly(0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1);
    }

    @Test
    void aRowThatNothingReplacesForMoreThanTenDaysIsToldWithItsFirstClose() {
        Market market = market("2020-01-02,0.9,0.1,2020-01-02\n");
        // the 13th is 11 days after the 2nd
        assertThat(findings(market))
                .singleElement()
                .asString()
                .startsWith("given.csv:2: at 2 closes nothing newer had become known for more than 10 calendar days")
                .contains("the first on 2020-01-13: the probabilities of 2020-01-02 still counted");
    }

    @Test
    void probabilitiesThatSumToOneButForTheirRoundingAreDividedByTheirSum() {
        Market market = market("2020-01-06,0.3333333,0.6666666,2020-01-06\n");
        double calm = market.table().knownAt(0).given(0, 0).orElseThrow();
        double stormy = market.table().knownAt(0).given(1, 0).orElseThrow();
        assertThat(calm + stormy).isCloseTo(1, within(Math.ulp(1.0)));
        assertThat(stormy).isCloseTo(0.6666666 / 0.9999999, within(1e-15));
    }

    @Test
    void aMarketWithoutSuchAFileHasNone() {
        assertThat(Fixture.market(folder, PRICES).table().knownAt(6).given(0, 6))
                .isEqualTo(OptionalDouble.empty());
    }

    @Test
    void everyFaultIsToldWhereItStands() {
        List<String> faults = faults("""
                2020-01-06,0.9,0.2,2020-01-06
                2020-01-07,1.9,-0.9,2020-01-07
                2020-01-08,x,0.1,2020-01-08
                2020-01-09,,0.1,2020-01-09
                2020-01-10,0.9,0.1,2020-01-09
                2020-01-10,0.9,0.1,2020-01-13
                2020-01-13,0.9,0.1,
                2020-01-14,0.9,0.1,14.01.2020
                """);
        assertThat(faults)
                .containsExactly(
                        "given.csv:2:12: the probabilities of calm, stormy sum to 1.1; give probabilities that sum to 1 in every"
                                + " row, one column for each of 'states'",
                        "given.csv:3:12: 1.9 is not a probability; write probabilities as fractions from 0 to 1, 0.7 for 70"
                                + " percent",
                        "given.csv:4:12: probability 'x' is not a number; write numbers such as 0.7",
                        "given.csv:5:12: a probability is missing; give one, or leave the row out: the one before goes on"
                                + " counting",
                        "given.csv:6:20: the probabilities of 2020-01-10 are said to be known on 2020-01-09; a probability cannot"
                                + " be known before the day it is of; write the day on which it became known",
                        "given.csv:7:1: date 2020-01-10 stands twice; keep one row for each date",
                        "given.csv:8:20: the row does not say when it became known; give every row the date on which it became"
                                + " known, e.g. 2001-10-23",
                        "given.csv:9:20: date '14.01.2020' is not written as yyyy-MM-dd; give every row the date on which it"
                                + " became known, e.g. 2001-10-23");
    }

    @Test
    void aMissingColumnIsToldWithTheNamesThatAreThere() {
        Fixture.write(folder, "given.csv", "date,calm,storm,known\n2020-01-06,1,0,2020-01-06\n");
        assertThat(Fixture.faults(this::read))
                .singleElement()
                .asString()
                .startsWith(
                        "given.csv:1:1: probabilities that are given name the column 'stormy', the header has 'date', 'calm'")
                .endsWith("did you mean 'storm'?");
    }

    @Test
    void theContentIsTheSameHoweverItIsWrittenAndAnotherWithAnotherDayOfBecomingKnown() {
        String digest = content("2020-01-06,0.90,0.1,2020-01-08\n");
        assertThat(content("2020-01-06,0.9,1e-1,2020-01-08\n")).isEqualTo(digest);
        assertThat(content("2020-01-06,0.9,0.1,2020-01-09\n")).isNotEqualTo(digest);
        assertThat(content("2020-01-06,0.8,0.2,2020-01-08\n")).isNotEqualTo(digest);
    }

    private String content(String rows) {
        return market(rows).files().stream()
                .filter(file -> file.role().equals(GivenColumns.ROLE))
                .map(InputFile::contentDigest)
                .findFirst()
                .orElseThrow();
    }

    private List<String> faults(String rows) {
        Fixture.write(folder, "given.csv", HEADER + rows);
        return Fixture.faults(this::read);
    }

    private Market market(String rows) {
        Fixture.write(folder, "given.csv", HEADER + rows);
        return read();
    }

    private Market read() {
        Fixture.write(folder, "prices.csv", PRICES);
        GivenColumns columns =
                new GivenColumns(new GivenSource(CsvLayout.of("given.csv"), "known"), List.of("calm", "stormy"));
        return PriceReader.read(
                folder,
                Map.of("stocks", PriceSource.of("prices.csv")),
                Calendar.DAILY,
                CashSource.NOTHING,
                List.of("stocks"),
                Set.of(),
                Optional.of(columns));
    }

    private static List<String> findings(Market market) {
        return market.findings().stream()
                .filter(finding -> finding.file().equals("given.csv"))
                .map(Finding::toString)
                .toList();
    }

    /** The probability of stormy at each close; -1 where there is none. */
    private static List<Double> stormy(Market market) {
        List<Double> found = new ArrayList<>();
        for (int bar = 0; bar < market.table().size(); bar++) {
            found.add(market.table().knownAt(bar).given(1, bar).orElse(-1));
        }
        return found;
    }
}
