package sojourn.strategy;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.allocate.Limits;
import sojourn.allocate.Misfit;
import sojourn.allocate.Pacing;
import sojourn.allocate.Rule;
import sojourn.allocate.Rules;
import sojourn.document.Document;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Place;
import sojourn.document.Problems;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.PriceSource;
import sojourn.walk.Observation;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.StateNames;

/**
 * Faults that only show when two sections are held side by side: a name that another section should declare, weights beyond the
 * limits. Each check is made if the pieces it needs read without fault, whatever ails the rest, so that the user hears of
 * everything in one go.
 */
final class BetweenSections {
    private final Document document;
    private final Optional<List<String>> assets;
    private final Optional<List<String>> states;
    private final Optional<RegimeSettings> regimes;
    private final Optional<Rule> rule;
    private final Optional<Limits> limits;

    private BetweenSections(Document document) {
        this.document = document;
        this.assets = sound("/prices", PriceSource.SECTION).map(prices -> List.copyOf(prices.keySet()));
        this.regimes = sound("/regimes", RegimeSettings.SHAPE);
        this.states = sound("/regimes/states", StateNames.SHAPE);
        this.rule = sound("/allocate", Rules.SHAPE);
        this.limits =
                document.at("/limits").isEmpty() ? Optional.of(Limits.longOnly()) : sound("/limits", Limits.SHAPE);
    }

    /** Adds every such fault of {@code document} to {@code problems}. */
    static void check(Document document, Problems problems) {
        BetweenSections sections = new BetweenSections(document);
        sections.observedAssets(problems);
        sections.windowSize(problems);
        sections.rule(problems);
        sections.yardstick(problems);
        sections.lots(problems);
    }

    private void observedAssets(Problems problems) {
        List<Misfit> found = new ArrayList<>();
        assets.ifPresent(known -> {
            sound("/regimes/observe", RegimeSettings.OBSERVATIONS).ifPresent(observed -> {
                for (int i = 0; i < observed.size(); i++) {
                    Observation one = observed.get(i);
                    checkAsset("/observe/" + i + "/" + one.word() + "/of", one.asset(), known, found);
                }
            });
            sound("/regimes/order-by", Shapes.text()).ifPresent(asset -> checkAsset("/order-by", asset, known, found));
        });
        add("/regimes", found, problems);
    }

    private static void checkAsset(String pointer, String asset, List<String> known, List<Misfit> found) {
        if (!known.contains(asset)) {
            found.add(Misfit.noAsset(pointer, Misfit.At.VALUE, asset, known));
        }
    }

    /** A rolling window that never holds what a fit needs would leave the strategy without any. */
    private void windowSize(Problems problems) {
        Optional<RefitSettings> refit = sound("/refit", RefitSettings.SHAPE);
        if (refit.isEmpty() || refit.get().rolling().isEmpty() || regimes.isEmpty()) {
            return;
        }
        int window = refit.get().rolling().getAsInt();
        int least = regimes.get().leastObservations();
        if (window < least) {
            String what = "a window of " + window + " observations is too small to fit "
                    + regimes.get().fewestStates() + " regimes";
            Misfit misfit = new Misfit("/window/rolling", what, "give at least " + least + ", better many more");
            add("/refit", List.of(misfit), problems);
        }
    }

    private void rule(Problems problems) {
        rule.ifPresent(stated -> {
            if (states.isPresent() && assets.isPresent()) {
                add("/allocate", stated.misfits(states.get(), assets.get()), problems);
            }
            limits.ifPresent(allowed -> add("/allocate", allowed.misfits(stated), problems));
            sound("/trade/stay-at-least", Shapes.integer().atLeast(1))
                    .ifPresent(bars -> add("/trade", Pacing.misfits(stated, bars), problems));
        });
    }

    private void yardstick(Problems problems) {
        Optional<Node> held = document.at("/judge/buy-and-hold");
        if (assets.isPresent() && held.isPresent() && held.get() instanceof MapNode weights) {
            add("/judge", Misfit.inWeights("/buy-and-hold", weights.keys(), assets.get()), problems);
        }
    }

    private void lots(Problems problems) {
        Optional<Node> lots = document.at("/trade/lots");
        if (assets.isPresent() && lots.isPresent() && lots.get() instanceof MapNode named) {
            add("/trade", Misfit.inWeights("/lots", named.keys(), assets.get()), problems);
        }
    }

    private <T> Optional<T> sound(String pointer, Shape<T> shape) {
        return document.at(pointer).flatMap(node -> shape.read(node, new Problems()));
    }

    private void add(String section, List<Misfit> misfits, Problems problems) {
        for (Misfit misfit : misfits) {
            problems.add(place(section + misfit.pointer(), misfit), misfit.what(), misfit.remedy());
        }
    }

    private Place place(String pointer, Misfit misfit) {
        if (misfit.within() > 0) {
            return document.placeWithin(pointer, misfit.within());
        }
        return misfit.at() == Misfit.At.KEY
                ? document.keyPlace(pointer)
                : document.nearest(pointer).place();
    }
}
