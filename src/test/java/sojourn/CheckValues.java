package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Objects;

/**
 * One worked case of {@code check-values/checks.json}: inputs, expected values computed by an independent implementation, and
 * the tolerances they are held to. Its README says where the numbers come from.
 */
public final class CheckValues {
    private static final JsonNode ALL = read();

    private final JsonNode node;

    private CheckValues(JsonNode node) {
        this.node = node;
    }

    /** The case named {@code id}; an unknown name is refused. */
    public static CheckValues byId(String id) {
        for (JsonNode each : ALL.get("cases")) {
            if (each.get("id").asText().equals(id)) {
                return new CheckValues(each);
            }
        }
        throw new IllegalArgumentException("no worked case is called " + id);
    }

    /** The input called {@code name}. */
    public JsonNode input(String name) {
        return part("inputs", name);
    }

    /** The expected value called {@code name}. */
    public JsonNode expected(String name) {
        return part("expected", name);
    }

    /** Whether the case states an input of that name. */
    public boolean hasInput(String name) {
        return node.get("inputs").has(name);
    }

    /** Whether the case expects a value of that name. */
    public boolean expects(String name) {
        return node.get("expected").has(name);
    }

    /** Asserts that {@code got} is the expected number called {@code name}, within the case's tolerances. */
    public void assertExpected(String name, double got) {
        assertClose(name, got, expected(name));
    }

    /** Asserts that {@code got} is the expected list called {@code name}, entry by entry. */
    public void assertExpected(String name, double[] got) {
        assertThat(got).as(name).hasSize(expected(name).size());
        for (int i = 0; i < got.length; i++) {
            assertClose(name + "[" + i + "]", got[i], expected(name).get(i));
        }
    }

    /** Asserts that {@code got} is the expected table called {@code name}, entry by entry. */
    public void assertExpected(String name, double[][] got) {
        assertThat(got.length).as(name).isEqualTo(expected(name).size());
        for (int i = 0; i < got.length; i++) {
            assertThat(got[i])
                    .as(name + "[" + i + "]")
                    .hasSize(expected(name).get(i).size());
            for (int j = 0; j < got[i].length; j++) {
                assertClose(
                        name + "[" + i + "][" + j + "]",
                        got[i][j],
                        expected(name).get(i).get(j));
            }
        }
    }

    /** Asserts {@code |got - expected| <= abs_tol + rel_tol |expected|}. */
    public void assertClose(String what, double got, JsonNode expected) {
        double value = expected.asDouble();
        double allowed = node.get("abs_tol").asDouble() + node.get("rel_tol").asDouble() * Math.abs(value);
        assertThat(got).as("%s of %s", what, node.get("id").asText()).isFinite();
        assertThat(Math.abs(got - value))
                .as("%s of %s: got %s, expected %s", what, node.get("id").asText(), got, value)
                .isLessThanOrEqualTo(allowed);
    }

    /** A JSON list of numbers. */
    public static double[] doubles(JsonNode list) {
        double[] values = new double[list.size()];
        for (int i = 0; i < values.length; i++) {
            values[i] = list.get(i).asDouble();
        }
        return values;
    }

    /** A JSON list of whole numbers. */
    public static int[] ints(JsonNode list) {
        int[] values = new int[list.size()];
        for (int i = 0; i < values.length; i++) {
            values[i] = list.get(i).asInt();
        }
        return values;
    }

    /** A JSON list of lists of numbers. */
    public static double[][] matrix(JsonNode rows) {
        double[][] values = new double[rows.size()][];
        for (int i = 0; i < values.length; i++) {
            values[i] = doubles(rows.get(i));
        }
        return values;
    }

    private JsonNode part(String part, String name) {
        return Objects.requireNonNull(
                node.get(part).get(name),
                () -> "case " + node.get("id").asText() + " has no " + name + " among its " + part);
    }

    private static JsonNode read() {
        try (InputStream in = CheckValues.class.getResourceAsStream("/check-values/checks.json")) {
            return new ObjectMapper().readTree(Objects.requireNonNull(in, "check-values/checks.json"));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
