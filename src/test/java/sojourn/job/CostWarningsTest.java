package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Costs that are left out although they would fall due, and fees that eat wealth up. */
class CostWarningsTest {
    private static final String OWED = "owed cash on";
    private static final String SHORT = "was short on";
    private static final String DRIFT = "pays its fee each time";

    @TempDir
    private Path temp;

    private static StrategyText holding(String in, String out, String trade) {
        return StrategyText.named("holding")
                .with("limits", "{gross: 2, per-asset: [-1, 2]}")
                .with("trade", trade)
                .with(
                        "allocate",
                        "{switch: {regime: stormy, leave-above: 0.7, re-enter-below: 0.3, in: {stocks: " + in
                                + "}, out: {stocks: " + out + "}}}");
    }

    @Test
    void whatIsBorrowedForNothingIsToldByWhatWasHeldAndNotByWhatIsAllowed() {
        assertThat(warnings("within", holding("0.9", "0.5", "{}"))).doesNotContain(OWED, SHORT, DRIFT);
        assertThat(warnings("leveraged", holding("1.5", "1.4", "{}")))
                .contains(OWED)
                .doesNotContain(SHORT);
        assertThat(warnings("charged", holding("1.5", "1.4", "{costs: {margin-percent-per-year: 1}}")))
                .doesNotContain(OWED, SHORT);
        assertThat(warnings("shorting", holding("-0.5", "-0.4", "{}")))
                .contains(SHORT)
                .doesNotContain(OWED);
        assertThat(warnings("lent", holding("-0.5", "-0.4", "{costs: {borrow-percent-per-year: 1}}")))
                .doesNotContain(OWED, SHORT);
    }

    @Test
    void aFeeForEveryDriftIsToldBeforeItIsPaid() {
        assertThat(warnings("drifting", holding("0.5", "0", "{costs: {fixed-fee: 5}}")))
                .contains(DRIFT);
        assertThat(warnings("banded", holding("0.5", "0", "{costs: {fixed-fee: 5}, no-trade-band: 0.05}")))
                .doesNotContain(DRIFT);
        JobFolder job = new JobFolder(temp).with("again.yaml", holding("0.5", "0", "{costs: {minimum-fee: 5}}"));
        assertThat(JobFolder.shell("check", job.path("again.yaml").toString())
                        .out()
                        .replaceAll("\\s+", " "))
                .contains(DRIFT);
    }

    private String warnings(String name, StrategyText strategy) {
        JobFolder job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(3, 400, LocalDate.of(2010, 1, 4)))
                .with(name + ".yaml", strategy);
        JobFolder.Ran ran = job.compare(name, name + ".yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        return job.record(name).get("warnings").toString();
    }
}
