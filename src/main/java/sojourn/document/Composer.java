package sojourn.document;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.events.AliasEvent;
import org.yaml.snakeyaml.events.CollectionStartEvent;
import org.yaml.snakeyaml.events.Event;
import org.yaml.snakeyaml.events.MappingStartEvent;
import org.yaml.snakeyaml.events.NodeEvent;
import org.yaml.snakeyaml.events.ScalarEvent;
import org.yaml.snakeyaml.parser.Parser;
import org.yaml.snakeyaml.parser.ParserImpl;
import org.yaml.snakeyaml.reader.StreamReader;

/**
 * Builds the located tree from SnakeYAML's events. Events, rather than SnakeYAML's own nodes, because they still show what
 * the nodes hide: which tags were written, where an alias stands, and how deep we are when it becomes too deep. A syntax
 * error or an exceeded limit ends the file; anything else is noted and reading goes on.
 */
final class Composer {
    private final Parser events;
    private final Place root;
    private final Problems problems;
    private final Map<String, Node> anchors = new HashMap<>();
    private final Set<String> openAnchors = new HashSet<>();
    private int nodes;
    private int aliases;

    private Composer(String file, String text, Problems problems) {
        this.events = new ParserImpl(new StreamReader(text), new LoaderOptions());
        this.root = Place.root(file);
        this.problems = problems;
    }

    /** The tree of {@code text}, whatever its root; empty, with exactly one problem added, if the file had to be given up. */
    static Optional<Node> compose(String file, String text, Problems problems) {
        Problems noted = new Problems();
        try {
            Limits.checkSize(file, text);
            Node tree = new Composer(file, text, noted).document();
            noted.list().forEach(problems::add);
            return Optional.of(tree);
        } catch (InputException e) {
            e.problems().forEach(problems::add);
        } catch (YAMLException e) {
            problems.add(SyntaxFault.of(e, file, text));
        }
        return Optional.empty();
    }

    private Node document() {
        events.getEvent(); // the stream's start
        if (events.checkEvent(Event.ID.StreamEnd)) {
            throw new InputException(problem(root, "the file is empty", "write at least one key and its value"));
        }
        events.getEvent(); // the document's start
        Node tree = node(root, 1);
        events.getEvent(); // the document's end
        if (!events.checkEvent(Event.ID.StreamEnd)) {
            Place second = at(root, events.peekEvent());
            throw new InputException(problem(second, "a second document begins here", "keep one document in a file"));
        }
        return tree;
    }

    /** The next node; {@code place} gives its path and name, the event its line and column. */
    private Node node(Place place, int depth) {
        NodeEvent event = (NodeEvent) events.getEvent();
        Place here = at(place, event);
        count(1, here);
        if (event instanceof AliasEvent) {
            return alias(event.getAnchor(), here, depth);
        }
        String anchor = event.getAnchor();
        if (anchor != null) {
            anchors.remove(anchor);
            openAnchors.add(anchor);
        }
        Node node = event instanceof ScalarEvent scalar
                ? scalar(scalar, here)
                : collection((CollectionStartEvent) event, here, depth);
        if (anchor != null) {
            openAnchors.remove(anchor);
            anchors.put(anchor, node);
        }
        return node;
    }

    private Node scalar(ScalarEvent event, Place here) {
        if (event.getTag() != null) {
            return refuseTag(event.getTag(), here);
        }
        String text = event.getValue();
        if (!event.isPlain()) {
            return new ScalarNode(here, ScalarNode.Kind.TEXT, text);
        }
        Optional<String> refusal = PlainScalar.refusal(text);
        if (refusal.isPresent()) {
            return broken(here, here.name() + " is " + Wording.shortened(text), refusal.get());
        }
        return new ScalarNode(here, PlainScalar.kind(text), text);
    }

    private Node collection(CollectionStartEvent event, Place here, int depth) {
        Limits.checkDepth(depth, here);
        if (event.getTag() != null) {
            refuseTag(event.getTag(), here);
        }
        return event instanceof MappingStartEvent ? map(here, depth) : list(here, depth);
    }

    private ListNode list(Place here, int depth) {
        List<Node> items = new ArrayList<>();
        while (!events.checkEvent(Event.ID.SequenceEnd)) {
            items.add(node(here.ofItem(items.size(), 1, 1), depth + 1));
        }
        events.getEvent();
        return new ListNode(here, items);
    }

    private MapNode map(Place here, int depth) {
        Map<String, MapNode.Entry> entries = new LinkedHashMap<>();
        while (!events.checkEvent(Event.ID.MappingEnd)) {
            Key key = key(here);
            Node value = node(key.place(), depth + 1);
            if (usable(key, entries)) {
                entries.put(key.text(), new MapNode.Entry(key.place(), value));
            }
        }
        events.getEvent();
        return new MapNode(here, entries);
    }

    /**
     * A key as written.
     *
     * @param tag its type tag, or ""
     */
    private record Key(String text, Style style, String tag, Place place) {}

    private enum Style {
        PLAIN,
        QUOTED,
        NOT_A_SCALAR
    }

    private Key key(Place map) {
        if (!(events.peekEvent() instanceof ScalarEvent event)) {
            Node skipped = node(map.ofKey("?", 1, 1), Limits.DEPTH);
            return new Key("?", Style.NOT_A_SCALAR, "", skipped.place());
        }
        events.getEvent();
        Place place = at(map.ofKey(event.getValue(), 1, 1), event);
        count(1, place);
        if (event.getAnchor() != null) {
            anchors.put(event.getAnchor(), new ScalarNode(place, ScalarNode.Kind.TEXT, event.getValue()));
        }
        String tag = Optional.ofNullable(event.getTag()).orElse("");
        return new Key(event.getValue(), event.isPlain() ? Style.PLAIN : Style.QUOTED, tag, place);
    }

    /** Whether a key can be used; told if not, and also when it is a second one. */
    private boolean usable(Key key, Map<String, MapNode.Entry> entries) {
        String text = key.text();
        Place place = key.place();
        if (key.style() == Style.NOT_A_SCALAR) {
            return refuseKey(place, "a key is not a single word", "write every key as a plain word");
        }
        if (!key.tag().isEmpty()) {
            refuseTag(key.tag(), place);
            return false;
        }
        if (key.style() == Style.PLAIN && text.equals("<<")) {
            return refuseKey(place, "the merge key << is not used here", "write the keys out where they belong");
        }
        if (text.isEmpty()) {
            return refuseKey(place, "a key is empty", "write a name before the colon");
        }
        boolean isText = PlainScalar.refusal(text).isEmpty() && PlainScalar.kind(text) == ScalarNode.Kind.TEXT;
        if (key.style() == Style.PLAIN && !isText) {
            String what = "key '" + Wording.shortened(text) + "' is not text";
            return refuseKey(place, what, "write it in quotes if it is meant as a name");
        }
        MapNode.Entry first = entries.get(text);
        if (first != null) {
            int line = first.keyPlace().line();
            String what = "key '" + Wording.shortened(text) + "' is written twice, first in line " + line;
            return refuseKey(place, what, "keep one of them");
        }
        return true;
    }

    private Node alias(String anchor, Place here, int depth) {
        aliases++;
        if (aliases > Limits.ALIASES) {
            throw Limits.exceeded(here, "more than " + Limits.ALIASES + " aliases", "write some of the values out");
        }
        if (openAnchors.contains(anchor)) {
            return broken(here, "alias '*" + anchor + "' stands inside the value that it names", "write the value out");
        }
        Node target = anchors.get(anchor);
        if (target == null) {
            return broken(
                    here,
                    "alias '*" + anchor + "' has no anchor before it",
                    "mark the value that is meant with &" + anchor);
        }
        Relocation.Extent extent = Relocation.extent(target);
        Limits.checkDepth(depth + extent.depth() - 1, here);
        count(extent.nodes(), here);
        return Relocation.moved(target, here);
    }

    private void count(int more, Place here) {
        nodes += more;
        Limits.checkNodes(nodes, here);
    }

    private boolean refuseKey(Place place, String what, String remedy) {
        problems.add(place, what, remedy);
        return false;
    }

    private Node refuseTag(String tag, Place here) {
        String shown = tag.startsWith("tag:yaml.org,2002:") ? "!!" + tag.substring("tag:yaml.org,2002:".length()) : tag;
        return broken(
                here,
                "type tag '" + Wording.shortened(shown) + "' is not used here",
                "leave it out, and put the value in quotes if it is text");
    }

    private Node broken(Place here, String what, String remedy) {
        problems.add(here, what, remedy);
        return new BrokenNode(here);
    }

    private static Problem problem(Place place, String what, String remedy) {
        return new Problem(place.file(), place.line(), place.column(), what, remedy);
    }

    private static Place at(Place place, Event event) {
        Mark mark = event.getStartMark();
        return place.at(mark.getLine() + 1, mark.getColumn() + 1);
    }
}
