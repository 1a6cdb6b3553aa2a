package sojourn.archive;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.market.InputFile;

/** What every kind of record says in the same way: which files went in, and how this run went. */
public final class RecordParts {
    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private RecordParts() {}

    /** The files that were read, each once, with what identifies them. */
    public static ArrayNode inputs(List<InputFile> read) {
        Map<String, InputFile> distinct = new LinkedHashMap<>();
        read.forEach(
                file -> distinct.putIfAbsent(file.sha256() + " " + file.role() + " " + file.contentDigest(), file));
        ArrayNode inputs = JSON.arrayNode();
        for (InputFile file : distinct.values()) {
            ObjectNode node = inputs.addObject();
            node.put("role", file.role());
            node.put("file", file.file());
            node.put("sha256", file.sha256());
            node.put("content_sha256", file.contentDigest());
            node.put("rows", file.rows());
            node.put("first", file.first().toString());
            node.put("last", file.last().toString());
        }
        return inputs;
    }

    /** The volatile facts, none of which changes a figure. */
    public static ObjectNode outsideTheDigest(RunFacts facts) {
        ObjectNode run = JSON.objectNode();
        run.put("version", ProgramVersion.current());
        ArrayNode command = run.putArray("command");
        facts.command().forEach(command::add);
        run.put("host", facts.host());
        run.put("threads", facts.threads());
        run.put("started_at", facts.startedAt());
        run.put("seconds", facts.seconds());
        return run;
    }
}
