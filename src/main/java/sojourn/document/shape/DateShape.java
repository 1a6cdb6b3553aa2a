package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** An ISO date, which exists in the calendar. */
public record DateShape() implements Shape<LocalDate> {
    private static final Pattern DATE = Pattern.compile("([0-9]{4})-([0-9]{2})-([0-9]{2})");

    @Override
    public Optional<LocalDate> read(Node node, Problems problems) {
        Optional<LocalDate> date = mayBe(node) ? parsed(((ScalarNode) node).text()) : Optional.empty();
        return date.isPresent() ? date : Wording.mismatch(this, node, problems);
    }

    private static Optional<LocalDate> parsed(String text) {
        Matcher parts = DATE.matcher(text);
        if (!parts.matches()) {
            return Optional.empty();
        }
        try {
            return Optional.of(LocalDate.of(
                    Integer.parseInt(parts.group(1)),
                    Integer.parseInt(parts.group(2)),
                    Integer.parseInt(parts.group(3))));
        } catch (DateTimeException e) {
            return Optional.empty(); // no such day, 2021-02-30 say: the caller tells
        }
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.text(((ScalarNode) node).text());
    }

    @Override
    public ObjectNode schema() {
        return Json.typed("string").put("format", "date").put("pattern", "^" + DATE.pattern() + "$");
    }

    @Override
    public String expected() {
        return "a date as yyyy-mm-dd, such as 2019-03-29";
    }

    @Override
    public boolean mayBe(Node node) {
        return TextShape.isText(node);
    }

    @Override
    public String hint(Node node) {
        return mayBe(node) && DATE.matcher(((ScalarNode) node).text()).matches() ? "there is no such day: " : "";
    }
}
