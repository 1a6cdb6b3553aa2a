package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.allocate.Schedule;
import sojourn.document.Document;
import sojourn.document.Problem;
import sojourn.document.Problems;

class TradeSettingsTest {
    @Test
    void everyKeyIsRead() {
        TradeSettings read = read("""
                decide: first-of-week
                fill: next-close
                delay: 2
                no-trade-band: 0.02
                stay-at-least: 5
                costs: {commission-bps: 5, half-spread-bps: 2.5}
                capital: 250000
                """);
        assertThat(read)
                .isEqualTo(new TradeSettings(
                        Schedule.FIRST_OF_WEEK, FillTime.NEXT_CLOSE, 2, 0.02, 5, new Costs(5, 2.5), 250_000));
        assertThat(read.terms()).isEqualTo(new Terms(new NextClose(2), new Costs(5, 2.5), 250_000));
    }

    @Test
    void everyKeyMayBeMissing() {
        assertThat(read("{}"))
                .isEqualTo(new TradeSettings(
                        Schedule.AT_EVERY_CLOSE, FillTime.NEXT_CLOSE, 0, 0, 1, Costs.none(), 1_000_000));
    }

    @Test
    void fillsSizesAndLotsAreRead() {
        TradeSettings read = read("{fill: next-open, delay: 1, size-at: decision, lots: {stocks: 10}}");
        assertThat(read.terms())
                .isEqualTo(new Terms(
                        new NextOpen(1), Costs.none(), 1_000_000, SizeAt.DECISION, new Lots(0, Map.of("stocks", 10))));
        assertThat(read("lots: 5").lots()).isEqualTo(new Lots(5, Map.of()));
        assertThat(read("{}").lots()).isEqualTo(Lots.FRACTIONS);
    }

    @Test
    void everyKindOfCostIsRead() {
        TradeSettings read = read("""
                costs:
                  commission-bps: 5
                  minimum-fee: 2
                  fixed-fee: 1
                  half-spread-bps: 2.5
                  spread-by-volatility: {share: 0.05, bars: 10}
                  stamp-duty-bps: 50
                  impact: {coefficient: 0.8, volume-bars: 20, volatility-bars: 60, participation-percent: 10}
                  borrow-percent-per-year: 1
                  margin-percent-per-year: 1.5
                """);
        assertThat(read.costs())
                .isEqualTo(new Costs(5, 2.5)
                        .withFees(2, 1)
                        .withSpreadOf(new SpreadOfVolatility(0.05, 10))
                        .withStampDuty(50)
                        .withImpact(new Impact(0.8, 20, 60, Optional.of(10.0)))
                        .withFinancing(1, 1.5));
        assertThat(read("costs: {impact: {}}").costs())
                .isEqualTo(Costs.none().withImpact(new Impact(1, 21, 21, Optional.empty())));
    }

    @Test
    void everyImpossibleValueIsReportedAtItsPlace() {
        Problems problems = new Problems();
        assertThat(tryRead("""
                decide: last-of-month
                fill: this-close
                delay: -1
                no-trade-band: 2
                stay-at-least: 0
                costs: {commission-bps: -5, half-spread-bps: 5}
                capital: 0
                """, problems)).isEmpty();
        assertThat(problems.list()).extracting(Problem::line).containsExactly(1, 2, 3, 4, 5, 6, 7);
        assertThat(problems.list().get(0).toString()).contains("last-of-month").contains("first-of-month");
        assertThat(problems.list().get(1).toString()).contains("this-close").contains("next-close");
    }

    @Test
    void basisPointsAreTenThousandths() {
        Costs costs = new Costs(5, 2.5);
        assertThat(costs.commissionRate()).isEqualTo(0.0005);
        assertThat(costs.halfSpreadRate()).isEqualTo(0.00025);
        assertThat(costs.oneWayRate()).isCloseTo(0.00075, within(1e-18));
    }

    private static TradeSettings read(String yaml) {
        Problems problems = new Problems();
        Optional<TradeSettings> settings = tryRead(yaml, problems);
        assertThat(problems.list()).isEmpty();
        return settings.orElseThrow();
    }

    private static Optional<TradeSettings> tryRead(String yaml, Problems problems) {
        Document document = Document.parse("strategy.yaml", yaml, problems).orElseThrow();
        return TradeSettings.SHAPE.read(document.root(), problems);
    }
}
