package org.modestead.host.bench.run;

import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;

/**
 * Results by what they depend on: the latest in memory, all that can be written on disk, where a later process finds them.
 * Thread-safe.
 */
public final class KeptResults implements AutoCloseable {

    private static final int MOST_IN_MEMORY = 64;
    private static final long LONGEST_WAIT_SECONDS = 10;

    private final ResultFolder folder;
    private final Map<String, NodeResult> memory = new LinkedHashMap<>(16, 0.75f, true);
    private final Map<String, Optional<Facts>> facts = new ConcurrentHashMap<>();
    private final ExecutorService writer = Executors.newSingleThreadExecutor(task -> {
        Thread thread = new Thread(task, "results");
        thread.setDaemon(true);
        return thread;
    });

    /** @param folder where results are kept */
    public KeptResults(ResultFolder folder) {
        this.folder = folder;
    }

    /**
     * What is known of a result without reading it.
     *
     * @param node id of the node that gave it
     * @param seconds it took
     * @param made when
     * @param doubts how many
     * @param anew whether making it again costs nothing, so that it is not copied to disk
     */
    public record Facts(String node, double seconds, Instant made, int doubts, boolean anew) {}

    /** Returns what is known of a result, empty when there is none. */
    public Optional<Facts> facts(String id) {
        return facts.computeIfAbsent(id, folder::facts);
    }

    /** Returns a result that is in memory, or can be read whole from disk. */
    public Optional<NodeResult> find(NodeDeclaration node, String id) {
        synchronized (memory) {
            NodeResult known = memory.get(id);
            if (known != null) {
                return Optional.of(known);
            }
        }
        if (facts(id).isEmpty()) {
            return Optional.empty();
        }
        Optional<NodeResult> read = folder.read(node, id);
        read.ifPresent(result -> remember(id, result));
        return read;
    }

    /** Keeps a result; on disk as soon as there is time. */
    public void keep(NodeDeclaration node, String id, NodeResult result, double seconds) {
        Facts known = new Facts(node.id(), seconds, Instant.now(), result.doubts().size(), ResultFolder.isMadeAnew(result));
        remember(id, result);
        facts.put(id, Optional.of(known));
        writer.execute(() -> folder.write(node, id, result, known));
    }

    /** Remembers a result that was made anew. */
    public void remember(String id, NodeResult result) {
        synchronized (memory) {
            memory.put(id, result);
            while (memory.size() > MOST_IN_MEMORY) {
                memory.remove(memory.keySet().iterator().next());
            }
        }
    }

    /** Waits until all is on disk, but not for ever. */
    @Override
    public void close() {
        writer.shutdown();
        try {
            if (!writer.awaitTermination(LONGEST_WAIT_SECONDS, TimeUnit.SECONDS)) {
                writer.shutdownNow();
            }
        } catch (InterruptedException hurried) {
            Thread.currentThread().interrupt();
        }
    }
}
