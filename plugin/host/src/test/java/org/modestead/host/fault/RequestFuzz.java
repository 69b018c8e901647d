package org.modestead.host.fault;

import java.io.IOException;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.TestBench;

/** Requests to a running bench: edits, undoing, redoing and looking. Nothing is run or saved, because a changed path could be any file. */
final class RequestFuzz implements FuzzedReader {

    private static final int SERVER_ERROR = 500;
    private static final List<String> POSTS = List.of("/api/edit", "/api/edit", "/api/edit", "/api/undo", "/api/redo", "/api/cancel");
    private static final List<String> GETS = List.of("/api/desk", "/api/steps/a/look", "/api/steps/%s/look", "/api/steps/a/figures/%s", "/api/%s", "/%s",
            "/api/files?folder=%s", "/api/workflow.json", "/api/nodes");

    private final TestBench bench;

    RequestFuzz(Path folder) throws IOException, InterruptedException {
        this.bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desks"), Optional.empty(), folder);
        // without an open desk every edit would be refused before it is read
        bench.post("/api/desk", "{\"empty\": true, \"name\": \"Night shift\"}");
    }

    @Override
    public String name() {
        return "requests";
    }

    @Override
    public byte[] next(Random random) {
        Mutations mutations = new Mutations(random);
        if (random.nextInt(3) == 0) {
            return String.format(GETS.get(random.nextInt(GETS.size())).replace("%s", "%1$s"), URLEncoder.encode(mutations.word(), StandardCharsets.UTF_8))
                    .getBytes(StandardCharsets.UTF_8);
        }
        String body = "{\"edits\":" + new String(EditFuzz.list(random, mutations), StandardCharsets.UTF_8) + ",\"label\":\"l\"}";
        return (POSTS.get(random.nextInt(POSTS.size())) + "\n" + body).getBytes(StandardCharsets.UTF_8);
    }

    @Override
    public boolean read(byte[] input) throws IOException, InterruptedException {
        String[] parts = new String(input, StandardCharsets.UTF_8).split("\n", 2);
        TestBench.Reply reply = parts.length == 1 ? bench.get(parts[0]) : bench.post(parts[0], parts[1]);
        if (reply.status() >= SERVER_ERROR) {
            throw new IllegalStateException(reply.status() + " " + reply.body());
        }
        return reply.status() < 300;
    }

    @Override
    public void close() {
        bench.close();
    }
}
