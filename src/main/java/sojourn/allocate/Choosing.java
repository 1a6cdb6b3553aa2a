package sojourn.allocate;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import sojourn.document.Field;

/** A rule that chooses the best mix of named assets, by an {@link Optimum}. */
sealed interface Choosing extends Sizing permits MinimumVariance, MeanVariance {
    /** The key that names the assets. */
    Field<List<String>> AMONG = Field.required("among", RuleKeys.ASSETS, "the assets to choose among");

    /** The assets, each once. */
    List<String> among();

    @Override
    default Set<String> namedAssets() {
        return new LinkedHashSet<>(among());
    }

    @Override
    default List<Misfit> misfits(List<String> regimes, List<String> assets) {
        return RuleKeys.unknownAssets("/" + word() + "/" + AMONG.key(), among(), assets);
    }
}
