package sojourn.archive;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.io.IOException;
import java.io.StringReader;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TableTest {
    /** RFC 4180, section 2, rules 5 to 7: quotes around commas, quotes and line breaks; quotes inside doubled. */
    @Test
    void commasQuotesAndLineBreaksAreQuotedAsTheRfcSays() {
        Table table = new Table(List.of("name", "note"));
        table.row().add("calm, then \"storm\"").add("two\nlines").end();
        assertThat(table.csv()).isEqualTo("name,note\n\"calm, then \"\"storm\"\"\",\"two\nlines\"\n");
    }

    @Test
    void anyTextReadsBackAsItWas() throws IOException {
        List<String> texts = List.of("a,b", "\"", "\"\"", "x\r\ny", " led and trailed ", "ŝtormo ☂", "", "#", "0x1p3");
        Table table = new Table(List.of("row", "text"));
        texts.forEach(text -> table.row().add("r").add(text).end());
        List<String> read = new ArrayList<>();
        for (CSVRecord row : CSVFormat.RFC4180.parse(new StringReader(table.csv()))) {
            read.add(row.get(1));
        }
        assertThat(read.subList(1, read.size())).isEqualTo(texts);
    }

    @ParameterizedTest
    @ValueSource(strings = {"=1+1", "+1", "-1", "@SUM(A1)", "\t=1", "\r=1", "=HYPERLINK(\"x\",\"y\")"})
    void aTextThatASpreadsheetWouldCalculateGetsAnApostrophe(String text) throws IOException {
        Table table = new Table(List.of("text"));
        table.row().add(text).end();
        List<CSVRecord> read =
                CSVFormat.RFC4180.parse(new StringReader(table.csv())).getRecords();
        assertThat(read.get(1).get(0)).isEqualTo("'" + text);
    }

    @Test
    void numbersAreShortestDecimalsThatReadBackToTheSameDouble() {
        Table table = new Table(List.of("x"));
        double[] plain = {0.1, -0.25, 1.0, Double.parseDouble("2.0E23"), Double.MIN_VALUE, Double.MAX_VALUE, 1.0 / 3};
        SplittableRandom random = new SplittableRandom(5);
        List<Double> values = new ArrayList<>();
        for (double value : plain) {
            values.add(value);
        }
        for (int i = 0; i < 500; i++) {
            double drawn = Double.longBitsToDouble(random.nextLong());
            values.add(Double.isFinite(drawn) ? drawn : i);
        }
        values.forEach(value -> table.row().add((double) value).end());
        for (int i = 0; i < values.size(); i++) {
            assertThat(Double.parseDouble(table.rows().get(i).get(0))).isEqualTo(values.get(i));
        }
        assertThat(table.rows().subList(0, 4))
                .containsExactly(List.of("0.1"), List.of("-0.25"), List.of("1.0"), List.of("2.0E23"));
    }

    @Test
    void aNegativeZeroIsWrittenAsZero() {
        Table table = new Table(List.of("x", "y"));
        table.row().add(-0.0).add(OptionalDouble.of(-0.0)).end();
        assertThat(table.csv()).isEqualTo("x,y\n0.0,0.0\n");
    }

    @Test
    void undefinedIsAnEmptyCellAndDatesAreIso() {
        Table table = new Table(List.of("date", "x", "y"));
        table.row()
                .add(LocalDate.of(2003, 2, 1))
                .add(OptionalDouble.empty())
                .blank()
                .end();
        assertThat(table.csv()).isEqualTo("date,x,y\n2003-02-01,,\n");
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void whatIsNoNumberIsRefusedWithItsColumn(double value) {
        Table.Row row = new Table(List.of("wealth")).row();
        assertThatIllegalArgumentException()
                .isThrownBy(() -> row.add(value))
                .withMessageContaining("wealth")
                .withMessageContaining(Double.toString(value));
    }

    @Test
    void aRowThatIsNotFullIsRefused() {
        Table.Row row = new Table(List.of("a", "b")).row().add("only one");
        assertThatIllegalArgumentException().isThrownBy(row::end).withMessageContaining("1 cells for 2 columns");
    }
}
