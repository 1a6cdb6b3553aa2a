package sojourn.world;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * The correlations between the log returns of the assets in one state, each pair stated once, in either order.
 *
 * @param stated correlation by first and second asset of each pair
 */
public record Correlations(Map<String, Map<String, Double>> stated) {
    private static final String KEY = "correlations";

    /** A pivot at or below this counts as none: rounding alone could have made it. */
    private static final double SMALLEST_PIVOT = 1e-10;

    /** Reads {@code {stocks: {bonds: -0.3, gold: 0.1}, bonds: {gold: 0.2}}}. */
    public static final Shape<Correlations> SHAPE = Shapes.named(
                    Listing.NAME,
                    Shapes.named(Listing.NAME, Shapes.number().atLeast(-1).atMost(1)))
            .as(Correlations::new);

    /** Copies. */
    public Correlations {
        Map<String, Map<String, Double>> copy = new LinkedHashMap<>();
        stated.forEach((asset, row) -> copy.put(asset, Collections.unmodifiableMap(new LinkedHashMap<>(row))));
        stated = Collections.unmodifiableMap(copy);
    }

    /** For a world with one asset. */
    public static Correlations none() {
        return new Correlations(Map.of());
    }

    /** Refuses unknown assets, pairs that are missing or stated twice, and correlations that cannot hold together. */
    Optional<Refusal> fault(List<String> assets) {
        for (Map.Entry<String, Map<String, Double>> row : stated.entrySet()) {
            Optional<Refusal> refusal = nameFault(row.getKey(), row.getValue(), assets);
            if (refusal.isPresent()) {
                return refusal;
            }
        }
        for (int i = 0; i < assets.size(); i++) {
            for (int j = 0; j < i; j++) {
                if (statement(assets.get(j), assets.get(i)).isEmpty()) {
                    return refused(
                            "the correlation of " + assets.get(j) + " and " + assets.get(i) + " is missing",
                            "state every pair of assets once");
                }
            }
        }
        double[] factor = new double[assets.size() * assets.size()];
        int failed = factorise(assets, factor);
        if (failed < 0) {
            return Optional.empty();
        }
        return refused(
                "the correlations of " + String.join(", ", assets.subList(0, failed + 1))
                        + " contradict each other (their matrix is not positive definite)",
                "bring the correlations of " + assets.get(failed) + " closer to 0");
    }

    /**
     * The lower triangular factor L of the correlation matrix L L', row-major, in the order of {@code assets}: independent
     * unit shocks times L are shocks with these correlations.
     *
     * @throws IllegalArgumentException where {@link #fault} refuses
     */
    double[] factor(List<String> assets) {
        fault(assets).ifPresent(refusal -> {
            throw new IllegalArgumentException(refusal.what());
        });
        double[] factor = new double[assets.size() * assets.size()];
        factorise(assets, factor);
        return factor;
    }

    /** Cholesky–Banachiewicz, row by row. {@code factor}: modified. The first row without a pivot; -1 if all have one. */
    private int factorise(List<String> assets, double[] factor) {
        int n = assets.size();
        for (int i = 0; i < n; i++) {
            double pivot = 1;
            for (int j = 0; j < i; j++) {
                double rest = statement(assets.get(j), assets.get(i)).orElse(0.0);
                for (int k = 0; k < j; k++) {
                    rest -= factor[i * n + k] * factor[j * n + k];
                }
                factor[i * n + j] = rest / factor[j * n + j];
                pivot -= factor[i * n + j] * factor[i * n + j];
            }
            if (!(pivot > SMALLEST_PIVOT)) {
                return i;
            }
            factor[i * n + i] = Math.sqrt(pivot);
        }
        return -1;
    }

    private Optional<Refusal> nameFault(String asset, Map<String, Double> row, List<String> assets) {
        for (String other : row.keySet()) {
            for (String name : List.of(asset, other)) {
                if (!assets.contains(name)) {
                    return refused(
                            "'" + name + "' is not an asset with a move here",
                            "name one of " + String.join(", ", assets));
                }
            }
            if (asset.equals(other)) {
                return refused(
                        "the correlation of " + asset + " with itself is stated",
                        "leave it out, it is 1 by definition");
            }
            if (stated.getOrDefault(other, Map.of()).containsKey(asset)) {
                return refused(
                        "the correlation of " + asset + " and " + other + " is stated twice",
                        "leave one of the two out");
            }
        }
        return Optional.empty();
    }

    private Optional<Double> statement(String one, String other) {
        return Optional.ofNullable(stated.getOrDefault(one, Map.of()).get(other))
                .or(() ->
                        Optional.ofNullable(stated.getOrDefault(other, Map.of()).get(one)));
    }

    private static Optional<Refusal> refused(String what, String remedy) {
        return Optional.of(new Refusal(KEY, what, remedy));
    }
}
