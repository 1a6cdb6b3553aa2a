package sojourn.evidence;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import sojourn.inference.Estimate;
import sojourn.inference.WeightedMoments;
import sojourn.regime.Fit;
import sojourn.regime.LongRun;
import sojourn.regime.Smoothed;
import sojourn.regime.WindowMoments;

/** Makes the identity cards of a subject's regimes. */
final class IdentityCards {
    private static final int LARGEST = 3;

    private final WalkedRegimes subject;
    private final int[] known;

    private IdentityCards(WalkedRegimes subject) {
        this.subject = subject;
        this.known = IntStream.range(0, subject.table().size())
                .filter(subject::known)
                .toArray();
    }

    /** One a regime, in role order; nothing before an accepted fit. */
    static Answer<List<IdentityCard>> of(WalkedRegimes subject) {
        if (subject.stretches().isEmpty()) {
            return Answer.none("no fit was accepted");
        }
        IdentityCards cards = new IdentityCards(subject);
        if (cards.known.length == 0) {
            return Answer.none("no fit was in force at any close");
        }
        List<IdentityCard> all = new ArrayList<>();
        for (int k = 0; k < subject.timeline().regimes().size(); k++) {
            all.add(new IdentityCard(subject.timeline().regimes().get(k), cards.lastFit(k), cards.asLived(k)));
        }
        return Answer.of(List.copyOf(all));
    }

    /** Of a regime that the last fit's number of regimes has none of, share 0 and nothing else. */
    private IdentityCard.LastFit lastFit(int k) {
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        Fit fit = last.record().fit();
        OptionalInt state = last.record().state(subject.timeline().regimes().get(k));
        if (state.isEmpty()) {
            WeightedMoments nothing = WeightedMoments.of(new double[0], new double[0]);
            return new IdentityCard.LastFit(OptionalDouble.of(0), OptionalDouble.empty(), nothing);
        }
        int own = state.getAsInt();
        OptionalDouble stay =
                fit.gauge().map(gauge -> LongRun.expectedStay(gauge, own)).orElseGet(OptionalDouble::empty);
        return new IdentityCard.LastFit(OptionalDouble.of(fit.occupancy()[own]), stay, windowReturns(last, own));
    }

    /** On bars with an observation whose return was known at the fit; {@code k} is the fit's own state. */
    private WeightedMoments windowReturns(Stretch last, int k) {
        Fit fit = last.record().fit();
        if (fit.model().isEmpty()) {
            return withoutErrors(fit, k);
        }
        int end = last.from() + 1;
        Smoothed smoothed = Smoothed.of(fit.model().get(), subject.rows(last.windowStart(), end));
        int[] bars = IntStream.range(last.windowStart(), Math.max(last.windowStart(), end - subject.barsLate()))
                .filter(bar -> subject.anyObserved(bar) && subject.returns().has(bar))
                .toArray();
        double[] weights = Arrays.stream(bars)
                .mapToDouble(bar -> smoothed.at(bar - last.windowStart(), k))
                .toArray();
        return WeightedMoments.of(weights, subject.returns().at(bars));
    }

    private WeightedMoments withoutErrors(Fit fit, int k) {
        WindowMoments moments = fit.moments().orElseThrow();
        Estimate none = new Estimate.Undefined(
                Estimate.Reason.NOT_APPLICABLE, "this gauge gives no probability of a regime given its whole window");
        return new WeightedMoments(
                fit.observations(),
                fit.occupancy()[k] * fit.observations(),
                Estimate.of(moments.mean(k, subject.asset())),
                none,
                Estimate.of(Math.sqrt(moments.covariance(k, subject.asset(), subject.asset()))),
                none);
    }

    private IdentityCard.AsLived asLived(int k) {
        double sum = 0;
        int likely = 0;
        int stays = 0;
        for (int i = 0; i < known.length; i++) {
            sum += subject.timeline().probability(known[i], k);
            if (subject.mostLikely(known[i]) == k) {
                likely++;
                boolean goesOn = i > 0 && known[i - 1] == known[i] - 1 && subject.mostLikely(known[i - 1]) == k;
                stays += goesOn ? 0 : 1;
            }
        }
        double share = (double) likely / known.length;
        Estimate stay = stays == 0 ? Estimate.tooFew(0, 1) : Estimate.of((double) likely / stays);
        return new IdentityCard.AsLived(sum / known.length, share, stay, stays, nextBar(k), largest(k));
    }

    private WeightedMoments nextBar(int k) {
        int[] bars = Arrays.stream(known)
                .filter(bar -> bar + 1 < subject.timeline().endBar()
                        && subject.returns().has(bar + 1))
                .toArray();
        double[] weights = Arrays.stream(bars)
                .mapToDouble(
                        bar -> subject.timeline().reading(bar).orElseThrow().predicted(1)[k])
                .toArray();
        int[] next = Arrays.stream(bars).map(bar -> bar + 1).toArray();
        return WeightedMoments.of(weights, subject.returns().at(next));
    }

    private List<IdentityCard.Large> largest(int k) {
        return Arrays.stream(known)
                .filter(bar -> subject.mostLikely(bar) == k && subject.returns().has(bar))
                .mapToObj(bar ->
                        new IdentityCard.Large(bar, subject.returns().at(bar).orElseThrow()))
                .sorted(Comparator.comparingDouble((IdentityCard.Large one) -> -Math.abs(one.earned()))
                        .thenComparingInt(IdentityCard.Large::bar))
                .limit(LARGEST)
                .toList();
    }
}
