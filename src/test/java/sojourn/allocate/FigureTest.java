package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class FigureTest {
    @Test
    void twoDecimalsSufficeWhereTheyTellTheTruth() {
        assertThat(Figure.of(0.8149)).isEqualTo("0.81");
        assertThat(Figure.beside(0.8149, 0.7)).isEqualTo("0.81");
        assertThat(Figure.level(0.7)).isEqualTo("0.70");
        assertThat(Figure.level(0.125)).isEqualTo("0.125");
        assertThat(Figure.level(1)).isEqualTo("1.00");
    }

    @Test
    void whatIsHeldAndWhatIsWantedGetAsManyDecimalsAsTellThemApart() {
        List<String> assets = List.of("stocks", "bonds", "gold");
        Weights held = Weights.each(3, asset -> List.of(0.999, 0.25, 0.0).get(asset));
        Weights target = Weights.each(3, asset -> List.of(1.0, 0.25, 0.05).get(asset));
        assertThat(Figure.apart(held, target, assets)).isEqualTo("stocks 0.999, not 1.000; gold 0.00, not 0.05");
    }

    @Test
    void aValueNearALevelGetsAsManyDecimalsAsItTakes() {
        assertThat(Figure.beside(0.6999, 0.7)).isEqualTo("0.6999");
        assertThat(Figure.beside(0.70001, 0.7)).isEqualTo("0.70001");
        assertThat(Figure.beside(0.7, 0.7)).isEqualTo("0.70");
        assertThat(Figure.beside(Math.nextUp(0.7), 0.7)).isGreaterThan("0.70000000000000");
    }
}
