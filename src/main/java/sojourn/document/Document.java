package sojourn.document;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A YAML file as a tree in which every key and value knows its line and column. Its root is a map.
 *
 * <p>The YAML accepted is a plain subset: one document, no type tags, no merge keys, text keys written once, numbers as in
 * JSON; {@code no}, {@code on} and dates are text. Anchors and aliases may be used. At most 1 048 576 characters, 50 levels,
 * 50 aliases.
 */
public final class Document {
    private static final int MOST_BYTES = 4 * Limits.CODE_POINTS;

    private final MapNode root;
    private final String text;

    private Document(MapNode root, String text) {
        this.root = root;
        this.text = text;
    }

    /**
     * Reads a text. Empty if it is no YAML map at all, with one problem that says why; otherwise there is a tree, even if
     * {@code problems} got some: duplicate keys, type tags and their like are noted and reading goes on.
     */
    public static Optional<Document> parse(String fileName, String text, Problems problems) {
        String withoutMark = text.startsWith("\uFEFF") ? text.substring(1) : text;
        Optional<Node> tree = Composer.compose(fileName, withoutMark, problems);
        if (tree.isPresent() && !(tree.get() instanceof MapNode)) {
            Node found = tree.get();
            if (!(found instanceof BrokenNode)) {
                problems.add(found, Wording.found(found), "write keys and values, one 'key: value' on each line");
            }
            return Optional.empty();
        }
        return tree.map(node -> new Document((MapNode) node, withoutMark));
    }

    /** Reads a UTF-8 file as {@link #parse} does; {@code shownName} is what messages call it. */
    public static Optional<Document> read(Path file, String shownName, Problems problems) {
        try (InputStream in = Files.newInputStream(file)) {
            byte[] bytes = in.readNBytes(MOST_BYTES + 1);
            if (bytes.length > MOST_BYTES) {
                throw Limits.tooLarge(shownName);
            }
            return parse(shownName, decoded(shownName, bytes), problems);
        } catch (InputException e) {
            e.problems().forEach(problems::add);
        } catch (NoSuchFileException e) {
            problems.add(new Problem(shownName, 0, 0, "there is no such file", "check the name and the folder"));
        } catch (IOException e) {
            String what = Files.isDirectory(file) ? "this is a folder" : "the file cannot be read";
            problems.add(new Problem(shownName, 0, 0, what, "give a YAML file that you may read"));
        }
        return Optional.empty();
    }

    /** The whole. */
    public MapNode root() {
        return root;
    }

    /** The node at a JSON pointer, {@code /prices/stocks/csv}; "" is the root. */
    public Optional<Node> at(String pointer) {
        Optional<Node> here = Optional.of(root);
        for (String step : steps(pointer)) {
            here = here.flatMap(node -> Tree.child(node, step));
        }
        return here;
    }

    /** The node at a JSON pointer or, where it is not written (a default, say), the innermost written node around it. */
    public Node nearest(String pointer) {
        Node here = root;
        for (String step : steps(pointer)) {
            Optional<Node> next = Tree.child(here, step);
            if (next.isEmpty()) {
                return here;
            }
            here = next.get();
        }
        return here;
    }

    /**
     * Where the character at {@code codePoint} of the text value at a JSON pointer stands, counted from 0; like {@link #nearest}
     * where there is no such value.
     */
    public Place placeWithin(String pointer, int codePoint) {
        Optional<Node> node = at(pointer);
        return node.isPresent() && node.get() instanceof ScalarNode scalar
                ? WithinScalar.of(text, scalar.place(), scalar.text(), codePoint)
                : nearest(pointer).place();
    }

    /** Where the key of an entry at a JSON pointer stands; like {@link #nearest} where there is no such key. */
    public Place keyPlace(String pointer) {
        List<String> steps = steps(pointer);
        if (steps.isEmpty()) {
            return root.place();
        }
        Optional<Node> around = Optional.of(root);
        for (String step : steps.subList(0, steps.size() - 1)) {
            around = around.flatMap(node -> Tree.child(node, step));
        }
        return around.flatMap(node ->
                        node instanceof MapNode map ? map.keyPlace(steps.get(steps.size() - 1)) : Optional.empty())
                .orElseGet(() -> nearest(pointer).place());
    }

    /**
     * The same document with {@code value} at a JSON pointer, in place of what is written there or added as a key; maps that
     * are not written yet are added around it. The value keeps its own lines and columns, so that a fault in it is placed
     * where it was written. Empty if a step of the pointer leads into a single value or beyond a list's end, and for the
     * root itself.
     */
    public Optional<Document> with(String pointer, Node value) {
        List<String> steps = steps(pointer);
        if (steps.isEmpty()) {
            return Optional.empty();
        }
        return Tree.with(root, steps, value).map(tree -> new Document((MapNode) tree, text));
    }

    /** The same document without a key of its root. */
    public Document without(String key) {
        Map<String, MapNode.Entry> entries = new LinkedHashMap<>(root.entries());
        entries.remove(key);
        return new Document(new MapNode(root.place(), entries), text);
    }

    private static List<String> steps(String pointer) {
        if (pointer.isEmpty()) {
            return List.of();
        }
        if (pointer.charAt(0) != '/') {
            throw new IllegalArgumentException("pointer is '" + pointer + "', must be empty or begin with /");
        }
        return Arrays.stream(pointer.substring(1).split("/", -1))
                .map(step -> step.replace("~1", "/").replace("~0", "~"))
                .toList();
    }

    private static String decoded(String shownName, byte[] bytes) {
        CharsetDecoder decoder = StandardCharsets.UTF_8
                .newDecoder()
                .onMalformedInput(CodingErrorAction.REPORT)
                .onUnmappableCharacter(CodingErrorAction.REPORT);
        CharBuffer text = CharBuffer.allocate(bytes.length + 1);
        CoderResult result = decoder.decode(ByteBuffer.wrap(bytes), text, true);
        text.flip();
        if (result.isError()) {
            Place place = TextPlace.end(shownName, text.toString());
            throw new InputException(new Problem(
                    shownName, place.line(), place.column(), "this byte is not UTF-8", "save the file as UTF-8"));
        }
        return text.toString();
    }
}
