package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.BooleanNode;
import com.fasterxml.jackson.databind.node.DoubleNode;
import com.fasterxml.jackson.databind.node.LongNode;
import com.fasterxml.jackson.databind.node.NullNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.util.List;
import java.util.SplittableRandom;

/** Random trees: any at all, and ones near {@link SampleStrategy}, some right and some wrong. */
final class RandomDocuments {
    private static final List<String> TRICKY = List.of(
            "no",
            "on",
            "~",
            "null",
            "true",
            "5",
            "010",
            "1_000",
            ".5",
            ".inf",
            "2020-01-01",
            "<<",
            "=",
            "- a",
            "a: b",
            "a #b",
            "#",
            "&a",
            "*a",
            "!x",
            "%",
            "@",
            "`",
            "'",
            "\"",
            "\\",
            "",
            " ",
            " lead",
            "trail ",
            "two\nlines\n",
            "\n",
            "\ttab",
            "[x]",
            "{x}",
            "x, y",
            "é🌊",
            "---",
            "...",
            "? x",
            "|",
            ">",
            "\u0007",
            "\u0085",
            "\u2028",
            "\uFEFF",
            "1e3",
            "0x1F",
            "12:30:45",
            "C:\\path",
            "a/b~c",
            "y",
            "N");

    private final SplittableRandom random;

    RandomDocuments(long seed) {
        this.random = new SplittableRandom(seed);
    }

    ObjectNode anyMap(int depth) {
        ObjectNode map = Json.object();
        int size = random.nextInt(5);
        for (int i = 0; i < size; i++) {
            String key = text();
            if (!key.isEmpty()) {
                map.set(key, any(depth - 1));
            }
        }
        return map;
    }

    private JsonNode any(int depth) {
        int kind = random.nextInt(depth > 0 ? 8 : 6);
        return switch (kind) {
            case 0 -> LongNode.valueOf(random.nextLong() >> random.nextInt(64));
            case 1 -> DoubleNode.valueOf(finite());
            case 2 -> BooleanNode.valueOf(random.nextBoolean());
            case 3 -> NullNode.instance;
            case 6 -> anyMap(depth);
            case 7 -> anyList(depth);
            default -> TextNode.valueOf(text());
        };
    }

    private ArrayNode anyList(int depth) {
        ArrayNode list = Json.array();
        int size = random.nextInt(5);
        for (int i = 0; i < size; i++) {
            list.add(any(depth - 1));
        }
        return list;
    }

    private double finite() {
        double value = Double.longBitsToDouble(random.nextLong());
        return Double.isFinite(value) ? value : random.nextInt(-3, 4) / 4.0;
    }

    private String text() {
        return random.nextInt(3) > 0
                ? TRICKY.get(random.nextInt(TRICKY.size()))
                : "word" + Integer.toString(random.nextInt(1000), 36);
    }

    /** Mostly right; each part is left out, replaced or misspelt once in a while. */
    ObjectNode nearSample() {
        ObjectNode strategy = Json.object();
        put(strategy, "strategy", TextNode.valueOf("s" + random.nextInt(9)));
        ObjectNode prices = Json.object();
        for (String asset : List.of("stocks", "bonds", random.nextInt(20) == 0 ? "Gold" : "gold")) {
            ObjectNode price = Json.object();
            put(price, "csv", TextNode.valueOf("a.csv"));
            if (random.nextBoolean()) {
                put(price, "close", TextNode.valueOf("adjusted"));
            }
            put(prices, asset, price);
        }
        put(strategy, "prices", prices);
        ArrayNode states = Json.array();
        for (int i = random.nextInt(5); i > 0; i--) {
            states.add("state" + i);
        }
        put(strategy, "states", states);
        if (random.nextBoolean()) {
            put(strategy, "refit", refit());
        }
        put(strategy, "allocate", rule());
        if (random.nextBoolean()) {
            String day =
                    String.format(java.util.Locale.ROOT, "20%02d-02-%02d", random.nextInt(30), 25 + random.nextInt(6));
            put(strategy, "from", TextNode.valueOf(day));
        }
        if (random.nextBoolean()) {
            put(strategy, "seed", number());
        }
        if (random.nextBoolean()) {
            put(strategy, "quiet", BooleanNode.valueOf(random.nextBoolean()));
        }
        if (random.nextBoolean()) {
            put(strategy, "band", DoubleNode.valueOf(random.nextInt(0, 6) / 10.0));
        }
        return strategy;
    }

    private ObjectNode refit() {
        ObjectNode refit = Json.object();
        if (random.nextBoolean()) {
            put(refit, "every", random.nextBoolean() ? number() : TextNode.valueOf("quarter"));
        }
        if (random.nextBoolean()) {
            ObjectNode rolling = Json.object();
            put(rolling, "rolling", number());
            put(refit, "window", random.nextBoolean() ? rolling : TextNode.valueOf("expanding"));
        }
        if (random.nextBoolean()) {
            put(refit, "starts", number());
        }
        return refit;
    }

    private ObjectNode rule() {
        ObjectNode rule = Json.object();
        int which = random.nextInt(20);
        if (which == 0 || which < 10) {
            ObjectNode change = Json.object();
            put(change, "regime", TextNode.valueOf("calm"));
            put(change, "leave-above", DoubleNode.valueOf(random.nextInt(5, 11) / 10.0));
            put(change, "re-enter-below", DoubleNode.valueOf(random.nextInt(0, 6) / 10.0));
            put(rule, "switch", change);
        }
        if (which == 0 || which >= 10) {
            ObjectNode hold = Json.object();
            put(hold, "stocks", DoubleNode.valueOf(random.nextInt(-10, 12) / 10.0));
            put(rule, "hold", hold);
        }
        return rule;
    }

    private JsonNode number() {
        return switch (random.nextInt(8)) {
            case 0 -> DoubleNode.valueOf(random.nextInt(100));
            case 1 -> DoubleNode.valueOf(random.nextInt(100) + 0.5);
            case 2 -> LongNode.valueOf(random.nextLong());
            default -> LongNode.valueOf(random.nextInt(0, 101));
        };
    }

    private void put(ObjectNode map, String key, JsonNode value) {
        switch (random.nextInt(90)) {
            case 0 -> map.set(key + "x", value);
            case 1 -> map.set(key, any(1));
            case 2 -> map.put(text() + "?", 1);
            default -> map.set(key, value);
        }
    }
}
