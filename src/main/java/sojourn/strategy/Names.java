package sojourn.strategy;

import java.util.ArrayList;
import java.util.List;
import sojourn.allocate.Misfit;
import sojourn.document.Nearest;
import sojourn.walk.Observation;

/** Names in one section that must be declared in another. */
final class Names {
    private Names() {}

    /** Assets that are observed, ordered by or compared with and have no price file; pointers from the root. */
    static List<Misfit> unknownAssets(Strategy strategy, List<String> assets) {
        List<Misfit> found = new ArrayList<>();
        List<Observation> observed = strategy.regimes().observe();
        for (int i = 0; i < observed.size(); i++) {
            check(
                    "/regimes/observe/" + i + "/" + observed.get(i).word(),
                    observed.get(i).asset(),
                    assets,
                    found);
        }
        strategy.regimes().orderBy().ifPresent(asset -> check("/regimes/order-by", asset, assets, found));
        for (String asset : strategy.judge().buyAndHold().keySet()) {
            check("/judge/buy-and-hold/" + asset, asset, assets, found);
        }
        return found;
    }

    private static void check(String pointer, String asset, List<String> assets, List<Misfit> found) {
        if (!assets.contains(asset)) {
            String hint = Nearest.to(asset, assets)
                    .map(nearest -> "did you mean '" + nearest + "'? ")
                    .orElse("");
            found.add(new Misfit(
                    pointer,
                    "'" + asset + "' is not an asset of 'prices'",
                    hint + "known assets: " + String.join(", ", assets)));
        }
    }
}
