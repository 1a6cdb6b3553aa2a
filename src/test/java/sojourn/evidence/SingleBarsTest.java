package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.regime.FilterState;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Matching;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;
import sojourn.walk.RegimeSettings;

/** Filters run again: what a bar changes, and what a refit changes, held to plain runs of the filter from the start of each window. */
class SingleBarsTest {
    private static final double SAME = 1e-11;
    private static WalkedRegimes subject;

    @BeforeAll
    static void walk() {
        subject = Subjects.walked(Subjects.twoWeathers(11, 900), 500, 40);
    }

    @Test
    void aFrozenFilterSaysWhatTheTimelineSaid() {
        for (Stretch stretch : subject.stretches()) {
            FrozenFilter filter = FrozenFilter.of(subject, stretch, stretch.end());
            for (int bar = stretch.from(); bar < stretch.end(); bar++) {
                assertThat(filter.probability(bar, 1))
                        .isEqualTo(subject.timeline().probability(bar, 1));
                assertThat(filter.mostLikely(bar)).isEqualTo(subject.mostLikely(bar));
            }
        }
    }

    @Test
    void stretchesFollowOneAnotherWithoutAGap() {
        List<Stretch> all = subject.stretches();
        assertThat(all).hasSize(10);
        assertThat(all.get(0).from()).isEqualTo(subject.timeline().firstBar().orElseThrow());
        for (int j = 1; j < all.size(); j++) {
            assertThat(all.get(j).from()).isEqualTo(all.get(j - 1).end());
        }
        assertThat(all.get(all.size() - 1).end()).isEqualTo(900);
        assertThat(all).allMatch(stretch -> stretch.windowStart() == 1);
    }

    @Test
    void leavingABarOutAgreesWithFilteringTheWindowWithoutIt() {
        Influence influence = Subjects.found(Influence.of(subject));
        assertThat(influence.bars()).hasSize(400);
        assertThat(influence.decisive()).hasSizeGreaterThan(5);
        for (Stretch stretch : subject.stretches()) {
            RegimeModel model = stretch.record().fit().model().orElseThrow();
            for (int bar = stretch.from(); bar < stretch.end(); bar += 7) {
                int left = bar;
                Influence.LeftOut got = influence.bars().stream()
                        .filter(one -> one.bar() == left)
                        .findFirst()
                        .orElseThrow();
                int changed = 0;
                for (int close = bar; close < stretch.end(); close++) {
                    changed += mostLikely(model, stretch, close, bar) == subject.mostLikely(close) ? 0 : 1;
                }
                assertThat(got.changed()).isEqualTo(changed);
                assertThat(got.without()).isEqualTo(mostLikely(model, stretch, bar, bar));
            }
        }
    }

    /** By the plain filter over the window, one observation of it missing. */
    private static int mostLikely(RegimeModel model, Stretch stretch, int close, int leftOut) {
        int rows = close + 1 - stretch.windowStart();
        double[] values = new double[rows];
        boolean[] missing = new boolean[rows];
        for (int row = 0; row < rows; row++) {
            values[row] = subject.observed().at(stretch.windowStart() + row).orElseThrow();
        }
        missing[leftOut - stretch.windowStart()] = true;
        FilterState filter = FilterState.after(model, Observations.of(1, values, missing));
        return filter.probability(1) > filter.probability(0) ? 1 : 0;
    }

    /** A gauge that remembers more than its probabilities may differ again after they were the same for a while. */
    @Test
    void leavingABarOutAgreesWithRunningEveryGaugeWithoutIt() {
        for (RegimeSettings settings : Rivals.of(subject.regimes())) {
            WalkedRegimes gauge = Subjects.walked(Subjects.twoWeathers(11, 900), settings, Subjects.expanding(500, 63));
            Stretch stretch = gauge.stretches().get(gauge.stretches().size() - 2);
            FrozenFilter filter = FrozenFilter.of(gauge, stretch, stretch.end());
            for (int bar = stretch.from(); bar < stretch.end(); bar++) {
                int[] got = filter.mostLikelyWithout(bar);
                GaugeFilter without =
                        stretch.record().fit().gauge().orElseThrow().filter();
                Observations rows = gauge.rows(stretch.windowStart(), stretch.end());
                Observations gap = Observations.of(1, new double[1], new boolean[] {true});
                for (int close = stretch.windowStart(); close < stretch.end(); close++) {
                    without = close == bar ? without.step(gap, 0) : without.step(rows, close - stretch.windowStart());
                    if (close >= bar) {
                        int most = without.probabilities().length > 1 && without.probability(1) > without.probability(0)
                                ? 1
                                : 0;
                        assertThat(got[close - bar])
                                .as("%s, bar %d left out, at %d", gauge.gauge(), bar, close)
                                .isEqualTo(most);
                    }
                }
            }
        }
    }

    @Test
    void theMostDecisiveComeFirst() {
        List<Influence.LeftOut> decisive = Subjects.found(Influence.of(subject)).decisive();
        for (int i = 1; i < decisive.size(); i++) {
            assertThat(decisive.get(i).changed())
                    .isBetween(1, decisive.get(i - 1).changed());
        }
        assertThat(decisive).allSatisfy(one -> {
            assertThat(one.until()).isBetween(one.bar(), one.bar() + 39);
            assertThat(one.changed()).isLessThanOrEqualTo(one.until() - one.bar() + 1);
        });
    }

    @Test
    void whatARefitMovesAgreesWithFilteringBothWindows() {
        List<LineageStep> steps = Subjects.found(Lineage.of(subject)).steps();
        List<Stretch> stretches = subject.stretches();
        assertThat(steps).hasSameSizeAs(stretches);
        assertThat(steps.get(0).before()).isEmpty();
        for (int j = 1; j < steps.size(); j++) {
            LineageStep.Before before = steps.get(j).before().orElseThrow();
            RegimeModel old = stretches.get(j - 1).record().fit().model().orElseThrow();
            RegimeModel now = stretches.get(j).record().fit().model().orElseThrow();
            int last = stretches.get(j).from();
            double most = 0;
            for (int bar = last - 59; bar <= last; bar++) {
                Observations rows = subject.rows(1, bar + 1);
                double gap = FilterState.after(now, rows).probability(1)
                        - FilterState.after(old, rows).probability(1);
                most = Math.max(most, Math.abs(gap));
            }
            assertThat(before.moved()).hasValueCloseTo(most, within(SAME));
            assertThat(before.fit()).isEqualTo(stretches.get(j - 1).record().number());
            assertThat(before.cost())
                    .isCloseTo(
                            Matching.squaredHellinger(old.emission(), 0, now.emission(), 0)
                                    + Matching.squaredHellinger(old.emission(), 1, now.emission(), 1),
                            within(SAME));
            assertThat(before.ancestor()).containsExactly(0, 1);
            assertThat(before.swapped()).isFalse();
        }
    }

    /** 1 - sqrt(2 * 1 * 2 / 5) = 1 - sqrt(4/5), two normals of the same mean. */
    @Test
    void aBirthIsADoubledDeviation() {
        assertThat(Lineage.BIRTH).isCloseTo(1 - Math.sqrt(0.8), within(1e-16));
        LineageStep.Before before = new LineageStep.Before(
                1, 0.3, Arrays.asList(1, 0), Arrays.asList(0.2, 0.1), java.util.OptionalDouble.empty());
        assertThat(before.births()).isEqualTo(1);
        assertThat(before.swapped()).isTrue();
    }

    @Test
    void oneRegimeHasNothingToDecide() {
        WalkedRegimes one = Subjects.rivals(subject).stream()
                .map(Rival::subject)
                .filter(rival -> rival.gauge().equals("one-regime"))
                .findFirst()
                .orElseThrow();
        assertThat(Influence.of(one).because()).contains("one regime");
    }
}
