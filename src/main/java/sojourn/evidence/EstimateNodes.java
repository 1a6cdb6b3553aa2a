package sojourn.evidence;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.OptionalDouble;
import sojourn.inference.Estimate;
import sojourn.inference.TestResult;

/** Estimates as JSON: a number, or undefined with the reason. */
final class EstimateNodes {
    private EstimateNodes() {}

    static ObjectNode of(Estimate estimate) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        if (estimate instanceof Estimate.Value value) {
            node.put("value", value.amount());
        } else if (estimate instanceof Estimate.Undefined none) {
            node.put("undefined", none.reason().name());
            node.put("because", none.because());
        }
        return node;
    }

    /** A number with its standard error. */
    static ObjectNode of(Estimate estimate, Estimate error) {
        ObjectNode node = of(estimate);
        if (estimate instanceof Estimate.Value && error instanceof Estimate.Value value) {
            node.put("standard_error", value.amount());
        }
        return node;
    }

    static ObjectNode of(OptionalDouble number, String because) {
        return number.isPresent()
                ? of(Estimate.of(number.getAsDouble()))
                : of(new Estimate.Undefined(Estimate.Reason.NOT_APPLICABLE, because));
    }

    static ObjectNode test(TestResult test) {
        ObjectNode node = of(test.statistic());
        test.pValue().number().ifPresent(p -> node.put("p", p));
        return node;
    }
}
