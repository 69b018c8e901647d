package org.modestead.host.fault;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.modestead.host.TestWorkflows;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** Workflow files: read, and one of many that hold a workflow checked as before a run, which starts a database for each query. */
final class WorkflowFuzz implements FuzzedReader {

    private static final NodeCatalog NODES = TestWorkflows.allNodes();
    private static final int SELDOM = 211;
    private final Path file;
    private final List<byte[]> samples = new ArrayList<>();

    WorkflowFuzz(Path folder) throws IOException {
        this.file = folder.resolve("workflow.json");
        try (Stream<Path> all = Files.walk(Path.of("../../test-workflows"), 2)) {
            for (Path sample : all.filter(path -> path.endsWith("workflow.json")).sorted().toList()) {
                samples.add(Files.readAllBytes(sample));
            }
        }
    }

    @Override
    public String name() {
        return "workflows";
    }

    @Override
    public byte[] next(Random random) {
        return new Mutations(random).text(samples.get(random.nextInt(samples.size())), samples.get(random.nextInt(samples.size())));
    }

    @Override
    public boolean read(byte[] input) {
        WorkflowFile.Reading reading = WorkflowFile.parse(file, input);
        if (reading.workflow().isEmpty() || input.length % SELDOM > 0) {
            return reading.problems().isEmpty();
        }
        return new WorkflowChecker(NODES).check(reading, List.of()).plan().isPresent();
    }
}
