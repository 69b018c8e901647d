package org.modestead.host.fault;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.desk.Edit;
import org.modestead.host.bench.desk.EditReader;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowText;
import org.modestead.nodes.contract.NodeCatalog;

/** Edits as the page sends them: read, done to one workflow after the other, and the workflow written as its journal does. */
final class EditFuzz implements FuzzedReader {

    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final int MOST_STEPS = 12;
    private static final List<String> EDITS = List.of("{\"do\":\"add\",\"node\":\"table-source\",\"id\":\"a\",\"settings\":{\"path\":\"t.csv\"},\"place\":0}",
            "{\"do\":\"add\",\"node\":\"table-query\",\"id\":\"b\",\"title\":\"t\",\"from\":\"a.table\"}", "{\"do\":\"remove\",\"steps\":[\"a\"]}",
            "{\"do\":\"copy\",\"steps\":[\"a\",\"b\"]}", "{\"do\":\"rename\",\"step\":\"a\",\"id\":\"c\"}",
            "{\"do\":\"link\",\"from\":\"a.table\",\"to\":\"b.input\",\"replace\":true}", "{\"do\":\"unlink\",\"from\":\"a.table\",\"to\":\"b.input\"}",
            "{\"do\":\"set\",\"step\":\"a\",\"settings\":{\"path\":\"u.csv\",\"skip-lines\":1}}", "{\"do\":\"set\",\"step\":\"a\",\"typed\":{\"skip-lines\":\"1\"}}",
            "{\"do\":\"title\",\"step\":\"a\",\"title\":\"t\"}", "{\"do\":\"note\",\"step\":\"b\",\"note\":\"n\"}", "{\"do\":\"move\",\"step\":\"b\",\"place\":0}",
            "{\"do\":\"name\",\"name\":\"n\"}", "{\"do\":\"notes\",\"notes\":\"n\"}");

    private final NodeCatalog catalog = TestWorkflows.allNodes();
    private Workflow workflow = start();

    private static Workflow start() {
        return new Workflow("start", Path.of("/desk/workflow.json"), List.of(), List.of());
    }

    @Override
    public String name() {
        return "edits";
    }

    @Override
    public byte[] next(Random random) {
        return list(random, new Mutations(random));
    }

    /** Returns a request's list of one to three edits, some of them changed. */
    static byte[] list(Random random, Mutations mutations) {
        StringBuilder text = new StringBuilder("[" + one(random, mutations));
        for (int k = random.nextInt(3); k > 0; k--) {
            text.append(',').append(one(random, mutations));
        }
        return (text + "]").getBytes(StandardCharsets.UTF_8);
    }

    private static String one(Random random, Mutations mutations) {
        String edit = EDITS.get(random.nextInt(EDITS.size()));
        return random.nextInt(3) == 0 ? edit : new String(mutations.text(edit.getBytes(StandardCharsets.UTF_8),
                EDITS.get(random.nextInt(EDITS.size())).getBytes(StandardCharsets.UTF_8)), StandardCharsets.UTF_8);
    }

    @Override
    public boolean read(byte[] input) throws IOException {
        JsonNode list;
        try {
            list = MAPPER.readTree(input);
        } catch (JsonProcessingException broken) {
            return false;
        }
        workflow = workflow.steps().size() > MOST_STEPS ? start() : workflow;
        for (Edit edit : EditReader.read(list)) {
            Workflow after = edit.apply(workflow, catalog).workflow();
            edit.words(workflow, catalog);
            WorkflowText.write(after);
            workflow = after;
        }
        return true;
    }
}
