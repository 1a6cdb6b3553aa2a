package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.NumberShape;
import sojourn.document.PlainScalar;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Wording;
import sojourn.numeric.Check;

/** A finite number; each bound may be absent. */
public record DoubleShape(Optional<Bound> low, Optional<Bound> high) implements NumberShape {
    /** A number this large where a fraction belongs was probably meant in per cent; one just above 1 may be anything. */
    private static final BigDecimal LEAST_PERCENT = BigDecimal.valueOf(2);

    public static final DoubleShape ANY = new DoubleShape(Optional.empty(), Optional.empty());

    /** A bound, which itself belongs to the range or does not. */
    record Bound(double value, Edge edge) {}

    enum Edge {
        INCLUDED,
        EXCLUDED
    }

    @Override
    public NumberShape atLeast(double bound) {
        return new DoubleShape(bound(bound, Edge.INCLUDED), high);
    }

    @Override
    public NumberShape atMost(double bound) {
        return new DoubleShape(low, bound(bound, Edge.INCLUDED));
    }

    @Override
    public NumberShape above(double bound) {
        return new DoubleShape(bound(bound, Edge.EXCLUDED), high);
    }

    @Override
    public NumberShape below(double bound) {
        return new DoubleShape(low, bound(bound, Edge.EXCLUDED));
    }

    @Override
    public Optional<Double> read(Node node, Problems problems) {
        if (mayBe(node)) {
            double value = ((ScalarNode) node).nearestDouble();
            if (allows(value)) {
                return Optional.of(value);
            }
        }
        return Wording.mismatch(this, node, problems);
    }

    private boolean allows(double value) {
        boolean highEnough = low.map(b -> b.edge() == Edge.INCLUDED ? value >= b.value() : value > b.value())
                .orElse(true);
        boolean lowEnough = high.map(b -> b.edge() == Edge.INCLUDED ? value <= b.value() : value < b.value())
                .orElse(true);
        return highEnough && lowEnough;
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.number(((ScalarNode) node).nearestDouble());
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("number");
        low.ifPresent(
                b -> schema.set(b.edge() == Edge.INCLUDED ? "minimum" : "exclusiveMinimum", Json.bound(b.value())));
        high.ifPresent(
                b -> schema.set(b.edge() == Edge.INCLUDED ? "maximum" : "exclusiveMaximum", Json.bound(b.value())));
        return schema;
    }

    @Override
    public String expected() {
        if (low.isPresent()
                && high.isPresent()
                && low.get().edge() == Edge.INCLUDED
                && high.get().edge() == Edge.INCLUDED) {
            return "a number from " + Json.shown(low.get().value()) + " to "
                    + Json.shown(high.get().value());
        }
        List<String> bounds = new ArrayList<>();
        low.ifPresent(b -> bounds.add((b.edge() == Edge.INCLUDED ? "at least " : "above ") + Json.shown(b.value())));
        high.ifPresent(b -> bounds.add((b.edge() == Edge.INCLUDED ? "at most " : "below ") + Json.shown(b.value())));
        return bounds.isEmpty() ? "a number" : "a number " + String.join(" and ", bounds);
    }

    @Override
    public boolean mayBe(Node node) {
        return WholeNumbers.isNumber(node);
    }

    @Override
    public String hint(Node node) {
        String text = node instanceof ScalarNode scalar ? scalar.text() : "";
        String number =
                text.endsWith("%") ? text.substring(0, text.length() - 1).strip() : text;
        if (!PlainScalar.isNumber(number)) {
            return "";
        }
        BigDecimal value = new BigDecimal(number);
        boolean percent = !number.equals(text);
        if (percent && !isFraction()) {
            return "leave out the % (a key that counts in per cent says so, any other in fractions): ";
        }
        boolean meantAsPercent = percent || (mayBe(node) && isFraction() && value.compareTo(LEAST_PERCENT) >= 0);
        BigDecimal fraction = value.movePointLeft(2);
        return meantAsPercent && allows(fraction.doubleValue())
                ? "did you mean " + fraction.stripTrailingZeros().toPlainString() + "? "
                : WholeNumbers.unquoteHint(node);
    }

    private boolean isFraction() {
        return low.isPresent()
                && high.isPresent()
                && low.get().value() == 0
                && high.get().value() == 1;
    }

    private static Optional<Bound> bound(double value, Edge edge) {
        return Optional.of(new Bound(Check.finite(value, "bound"), edge));
    }
}
