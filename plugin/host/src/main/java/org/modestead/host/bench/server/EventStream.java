package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.sse.SseClient;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.bench.work.Workbench;

/**
 * Tells every page that listens how the desk stands. Each gets the whole desk first and after every change, the newest one only, so
 * that a page which was away or is slow misses nothing.
 */
final class EventStream implements AutoCloseable {

    private static final long PROGRESS_MILLIS = 200;
    private static final long SIGN_OF_LIFE_MILLIS = 10_000;

    private final Workbench workbench;
    private final DeskJson json;
    private final ExecutorService tellers = Executors.newCachedThreadPool(task -> {
        Thread thread = new Thread(task, "events");
        thread.setDaemon(true);
        return thread;
    });

    EventStream(Workbench workbench, DeskJson json) {
        this.workbench = workbench;
        this.json = json;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.sse("/api/events", client -> {
            client.keepAlive();
            tellers.execute(() -> tell(client));
        });
    }

    private void tell(SseClient client) {
        long known = -1;
        long quiet = 0;
        try {
            while (!client.terminated()) {
                Optional<DeskView> changed = workbench.await(known, PROGRESS_MILLIS);
                Optional<Workbench.Going> going = changed.isPresent() ? Optional.empty() : workbench.going();
                if (changed.isPresent()) {
                    known = changed.get().revision();
                    client.sendEvent("desk", Answer.text(json.of(changed.get())), Long.toString(known));
                } else if (going.isPresent()) {
                    client.sendEvent("progress", Answer.text(progress(going.get())), Long.toString(going.get().revision()));
                }
                quiet = changed.isPresent() || going.isPresent() ? 0 : quiet + PROGRESS_MILLIS;
                if (quiet >= SIGN_OF_LIFE_MILLIS) {
                    client.sendComment("still here");
                    quiet = 0;
                }
            }
        } catch (InterruptedException ending) {
            farewell(client);
            Thread.currentThread().interrupt();
        }
    }

    /** Tells a page that the bench ends; one that left in the same moment has no answer any more to write to, which is no defect. */
    private static void farewell(SseClient client) {
        try {
            client.sendEvent("bye", "{\"sentence\": \"The bench has ended; start it again with the command.\"}", "");
            client.close();
        } catch (IllegalStateException left) {
            client.close();
        }
    }

    private static ObjectNode progress(Workbench.Going going) {
        ObjectNode json = JsonNodeFactory.instance.objectNode().put("revision", going.revision());
        json.set("run", DeskJson.run(going.run()));
        ObjectNode states = json.putObject("states");
        going.states().forEach((step, state) -> states.set(step, DeskJson.state(state)));
        return json;
    }

    @Override
    public void close() {
        tellers.shutdownNow();
    }
}
