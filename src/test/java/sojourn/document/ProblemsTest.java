package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class ProblemsTest {
    private static Problem at(String file, int line, int column, String what) {
        return new Problem(file, line, column, what, "mend it");
    }

    @Test
    void filesStayInOrderOfFirstFaultAndFaultsFollowTheText() {
        Problems problems = new Problems();
        problems.add(at("z.yaml", 10, 2, "a"));
        problems.add(at("a.csv", 5, 0, "b"));
        problems.add(at("z.yaml", 9, 7, "c"));
        problems.add(at("z.yaml", 10, 1, "d"));
        problems.add(at("z.yaml", 10, 2, "e"));
        problems.add(at("z.yaml", 0, 0, "f"));
        problems.add(at("z.yaml", 9, 7, "c"));
        assertThat(problems.list().stream().map(Problem::toString))
                .containsExactly(
                        "z.yaml: f; mend it",
                        "z.yaml:9:7: c; mend it",
                        "z.yaml:10:1: d; mend it",
                        "z.yaml:10:2: a; mend it",
                        "z.yaml:10:2: e; mend it",
                        "a.csv:5: b; mend it");
    }

    /** Written by code: an escape sequence could repaint a terminal, an override of direction could turn a message round. */
    @Test
    void charactersThatWouldActOnATerminalAreWrittenAsTheirCode() {
        Problem problem = new Problem("a", 1, 1, "x\u001B[31m\u0085\u202Ey", "z\n\\u");
        assertThat(problem.what()).isEqualTo("x\\u001B[31m\\u0085\\u202Ey");
        assertThat(problem.remedy()).isEqualTo("z\\u000A\\u");
        String plain = "größer als 5 €, «so» – 中";
        assertThat(new Problem("a", 1, 1, plain, plain).what()).isEqualTo(plain);
    }

    @Test
    void allAreThrownAtOnce() {
        Problems problems = new Problems();
        problems.throwIfAny();
        problems.add(at("a", 2, 1, "y"));
        problems.add(at("a", 1, 1, "x"));
        assertThatThrownBy(problems::throwIfAny)
                .isInstanceOf(InputException.class)
                .hasMessage("a:1:1: x; mend it\na:2:1: y; mend it");
    }
}
