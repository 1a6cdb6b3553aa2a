package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import sojourn.inference.Estimate;
import sojourn.inference.WeightedMoments;
import sojourn.numeric.RandomStream;

/** Nothing is annualised from less than a year of a regime, however many bars it is a small part of. */
class AnnualTest {
    private static final WalkedRegimes SUBJECT = Subjects.walked(Subjects.twoWeathers(2, 260), 200, 50);

    private static Annual ofWeights(double each) {
        RandomStream random = RandomStream.of(4, "returns");
        double[] returns = new double[1000];
        Arrays.setAll(returns, t -> 0.01 * random.nextNormal());
        double[] weights = new double[1000];
        Arrays.fill(weights, each);
        return Annual.of(SUBJECT, WeightedMoments.of(weights, returns));
    }

    /** 252 bars a year: 1000 bars of weight 0.25 are 250 bars of the regime, of weight 0.26 they are 260. */
    @Test
    void aRegimeOfLessThanAYearIsNotAnnualised() {
        Annual less = ofWeights(0.25);
        assertThat(less.mean()).isInstanceOf(Estimate.Undefined.class);
        assertThat(less.volatility()).isInstanceOf(Estimate.Undefined.class);
        assertThat(ofWeights(0.26).volatility()).isInstanceOf(Estimate.Value.class);
    }
}
