package sojourn.archive;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.measure.Attribution;
import sojourn.measure.Measured;
import sojourn.measure.RandomSwitches;
import sojourn.measure.RegimeTable;

/**
 * What {@code measures.json} tells of a variant.
 *
 * @param strategy what the variant came to
 * @param yardsticks what each yardstick came to, by column name
 * @param absent why other yardsticks that were asked for are undefined, by column name
 * @param randomSwitches where the variant falls among random switchers, if that was asked for and can be told
 * @param differenceOverTheWindow to buy-and-hold in total returns, in parts
 * @param differencePerYear to buy-and-hold in growth per year, in parts
 * @param byRegime the variant's returns by regime
 * @param regimes names of the regimes
 * @param parameters whether the regime model was fitted or declared
 * @param barsPerYear as declared by the length of the bars
 */
public record VariantMeasures(
        ComparisonRow.Judged strategy,
        Map<String, ComparisonRow.Judged> yardsticks,
        Map<String, Measured.Undefined> absent,
        Optional<RandomSwitches> randomSwitches,
        Attribution differenceOverTheWindow,
        Attribution differencePerYear,
        RegimeTable byRegime,
        List<String> regimes,
        ComparisonRow.Parameters parameters,
        double barsPerYear) {}
