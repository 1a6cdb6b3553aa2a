package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.document.ScalarNode.Kind;

class PlainScalarTest {
    private static Kind kind(String text) {
        assertThat(PlainScalar.refusal(text)).as(text).isEmpty();
        return PlainScalar.kind(text);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "0",
                "-0",
                "+5",
                "5",
                "10",
                "0.5",
                "-1.25",
                "1e3",
                "1E+3",
                "2.5e-7",
                "0e0",
                "4.9e-324",
                "1.7976931348623157e308"
            })
    void jsonNumbersWithAnySignAreNumbers(String text) {
        assertThat(kind(text)).isEqualTo(Kind.NUMBER);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "no",
                "yes",
                "on",
                "off",
                "y",
                "n",
                "True",
                "FALSE",
                "Null",
                "2020-01-01",
                "12:30",
                "190:20:30",
                "1.2.3",
                "1-2",
                "e3",
                "5%",
                "NaN",
                "Infinity",
                "_1",
                "-",
                "+",
                "0x",
                "1_000 apples",
                "1__x"
            })
    void wordsStayWords(String text) {
        assertThat(kind(text)).isEqualTo(Kind.TEXT);
    }

    @ParameterizedTest
    @ValueSource(strings = {"true", "false"})
    void onlyTheseTwoAreFlags(String text) {
        assertThat(kind(text)).isEqualTo(Kind.FLAG);
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "~", "null"})
    void nothingIsNothing(String text) {
        assertThat(kind(text)).isEqualTo(Kind.NOTHING);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "010",
                "-007",
                "00",
                "01.5",
                "0123e4",
                "0x1F",
                "0o17",
                "0b101",
                "1_000",
                "-1_0.5",
                "0_1",
                "0x_F",
                ".5",
                "-.5",
                "5.",
                "5.e3",
                ".inf",
                "-.Inf",
                "+.INF",
                ".nan",
                ".NaN",
                "1e999",
                "-1e400",
                "1e-400",
                "1e999999999999",
                "1e-999999999999"
            })
    void whatReadersDisagreeAboutIsRefused(String text) {
        assertThat(PlainScalar.refusal(text)).as(text).isPresent();
    }

    @ParameterizedTest
    @ValueSource(ints = {100, 101, 100_000})
    void aNumberHasAtMostAHundredCharacters(int length) {
        String digits = "1" + "0".repeat(length - 3) + ".5";
        assertThat(PlainScalar.refusal("0." + "3".repeat(length - 2)).isPresent())
                .isEqualTo(length > 100);
        assertThat(PlainScalar.refusal(digits).isPresent()).isEqualTo(length > 100);
    }
}
