package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class LimitsTest {
    private static List<String> problems(String text) {
        Problems problems = new Problems();
        boolean present = Document.parse("t.yaml", text, problems).isPresent();
        assertThat(present).isEqualTo(problems.isEmpty());
        return problems.list().stream().map(Problem::toString).toList();
    }

    @Test
    void aMillionCharactersAreReadAndOneMoreRefused() {
        String start = "a: ";
        String most = start + "🌊".repeat(Limits.CODE_POINTS - start.length());
        assertThat(problems(most)).isEmpty();
        assertThat(problems(most + "x"))
                .containsExactly("t.yaml: the file has more than 1048576 characters; give a smaller file");
    }

    @Test
    void fiftyLevelsAreReadAndOneMoreRefused() {
        assertThat(problems(nested(Limits.DEPTH))).isEmpty();
        String expected = "t.yaml:1:53: maps and lists are nested more than 50 deep; nest them less deeply";
        assertThat(problems(nested(Limits.DEPTH + 1))).containsExactly(expected);
        assertThat(problems(nested(100_000))).containsExactly(expected);
    }

    /** The root map is the first level. */
    private static String nested(int levels) {
        return "a: " + "[".repeat(levels - 1) + "]".repeat(levels - 1);
    }

    @Test
    void deepKeysAreRefusedToo() {
        assertThat(problems("? " + "[".repeat(60) + "]".repeat(60) + "\n: x\n"))
                .containsExactly("t.yaml:1:4: maps and lists are nested more than 50 deep; nest them less deeply");
    }

    @Test
    void levelsBehindAnAliasCount() {
        String deep = "a: &a " + "[".repeat(30) + "]".repeat(30) + "\n";
        assertThat(problems(deep + "b: " + "[".repeat(19) + "*a" + "]".repeat(19) + "\n"))
                .isEmpty();
        assertThat(problems(deep + "b: " + "[".repeat(20) + "*a" + "]".repeat(20) + "\n"))
                .containsExactly("t.yaml:2:24: maps and lists are nested more than 50 deep; nest them less deeply");
    }

    @Test
    void fiftyAliasesAreReadAndOneMoreRefused() {
        String start = "a: &a 1\nb: [";
        assertThat(problems(start + "*a, ".repeat(Limits.ALIASES) + "]\n")).isEmpty();
        assertThat(problems(start + "*a, ".repeat(Limits.ALIASES + 1) + "]\n"))
                .containsExactly("t.yaml:2:205: more than 50 aliases; write some of the values out");
    }

    @Test
    void aliasesThatMultiplyAreStoppedEarly() {
        // the "billion laughs": nine levels of nine aliases would write 9^9 values
        StringBuilder laughs = new StringBuilder("a0: &a0 [lol, lol, lol, lol, lol, lol, lol, lol, lol]\n");
        for (int level = 1; level <= 9; level++) {
            String alias = "*a" + (level - 1);
            laughs.append("a%d: &a%d [%s]\n"
                    .formatted(
                            level,
                            level,
                            String.join(", ", List.of(alias, alias, alias, alias, alias, alias, alias, alias, alias))));
        }
        assertThat(problems(laughs.toString()))
                .singleElement()
                .asString()
                .startsWith("t.yaml:6:")
                .contains("100000 keys and values");
    }

    @Test
    void valuesAreCountedUpToTheLimit() {
        // the root, the key, the list and its items
        assertThat(problems("a: [" + "x,".repeat(Limits.NODES - 3) + "]")).isEmpty();
        assertThat(problems("a: [" + "x,".repeat(Limits.NODES - 2) + "]"))
                .singleElement()
                .asString()
                .endsWith("there are more than 100000 keys and values up to here; give a smaller file");
    }
}
