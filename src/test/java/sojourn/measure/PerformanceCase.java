package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.CheckValues;

/** A worked case of returns, cash and dates as a path of wealth; its numbers come from an independent implementation in plain numpy. */
final class PerformanceCase {
    private final CheckValues worked;

    private PerformanceCase(CheckValues worked) {
        this.worked = worked;
    }

    static PerformanceCase byId(String id) {
        return new PerformanceCase(CheckValues.byId(id));
    }

    CheckValues worked() {
        return worked;
    }

    double[] returns() {
        return CheckValues.doubles(worked.input("returns"));
    }

    double[] cashReturns() {
        return CheckValues.doubles(worked.input("cash_returns"));
    }

    double periodsPerYear() {
        return worked.input("periods_per_year").asDouble();
    }

    double tail() {
        return worked.input("tail").asDouble();
    }

    EvaluatedPath path() {
        return EvaluatedPath.of(dates(worked.input("dates")), wealth(1000, returns()), cashReturns(), periodsPerYear());
    }

    /** Asserts that a measure has the expected value called {@code name}. */
    void assertExpected(String name, Measured got) {
        assertThat(got.number()).as(name).isPresent();
        worked.assertExpected(name, got.number().getAsDouble());
    }

    static List<LocalDate> dates(JsonNode list) {
        List<LocalDate> dates = new ArrayList<>();
        list.forEach(each -> dates.add(LocalDate.parse(each.asText())));
        return dates;
    }

    static double[] wealth(double first, double... returns) {
        double[] wealth = new double[returns.length + 1];
        wealth[0] = first;
        for (int i = 0; i < returns.length; i++) {
            wealth[i + 1] = wealth[i] * (1 + returns[i]);
        }
        return wealth;
    }
}
