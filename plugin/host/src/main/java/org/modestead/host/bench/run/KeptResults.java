package org.modestead.host.bench.run;

import java.time.Instant;
import java.util.HashSet;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;

/**
 * Results by what they depend on: the latest in memory, all that can be written on disk, where a later process finds them. There is a
 * result as long as it is in memory or on disk, whoever removed it there. Thread-safe.
 */
public final class KeptResults implements AutoCloseable {

    private static final int MOST_IN_MEMORY = 64;
    private static final int MOST_KNOWN = 512;
    private static final long LONGEST_WAIT_SECONDS = 10;
    private static final long LOOK_MILLIS = 200;

    private final ResultFolder folder;
    private final int mostInMemory;
    private final Map<String, Held> memory = new LinkedHashMap<>(16, 0.75f, true);
    private final Set<String> unwritten = new HashSet<>();
    /** What was read of results on disk; counts only as long as they are there. */
    private final Map<String, Facts> read = new LinkedHashMap<>(16, 0.75f, true);
    private final ExecutorService writer = Executors.newSingleThreadExecutor(task -> {
        Thread thread = new Thread(task, "results");
        thread.setDaemon(true);
        return thread;
    });

    /** @param folder where results are kept */
    public KeptResults(ResultFolder folder) {
        this(folder, MOST_IN_MEMORY);
    }

    /**
     * @param folder where results are kept
     * @param mostInMemory results that are kept in memory too, at least 0; those not yet written are beside
     */
    public KeptResults(ResultFolder folder, int mostInMemory) {
        this.folder = folder;
        this.mostInMemory = mostInMemory;
    }

    private record Held(NodeResult result, Facts facts) {}

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

    /** Returns what is known of a result, empty when there is none, or none any more. */
    public Optional<Facts> facts(String id) {
        synchronized (memory) {
            Held held = memory.get(id);
            if (held != null) {
                return Optional.of(held.facts());
            }
            if (!folder.has(id)) {
                read.remove(id);
                return Optional.empty();
            }
            Optional<Facts> known = Optional.ofNullable(read.get(id)).or(() -> folder.facts(id));
            known.ifPresent(facts -> read.put(id, facts));
            trim(read, MOST_KNOWN, Set.of());
            return known;
        }
    }

    /** Returns a result that is in memory, or can be read whole from disk; one that cannot is gone from then on. */
    public Optional<NodeResult> find(NodeDeclaration node, String id) {
        synchronized (memory) {
            Held held = memory.get(id);
            if (held != null) {
                return Optional.of(held.result());
            }
        }
        Optional<Facts> facts = facts(id);
        Optional<NodeResult> found = facts.isEmpty() ? Optional.empty() : folder.read(node, id);
        found.ifPresent(result -> hold(id, new Held(result, facts.orElseThrow())));
        return found;
    }

    /** Keeps a result; on disk as soon as there is time. */
    public void keep(NodeDeclaration node, String id, NodeResult result, double seconds) {
        Facts known = new Facts(node.id(), seconds, Instant.now(), result.doubts().size(), ResultFolder.isMadeAnew(result));
        synchronized (memory) {
            unwritten.add(id);
            hold(id, new Held(result, known));
        }
        writer.execute(() -> {
            try {
                folder.write(node, id, result, known);
            } finally {
                written(id);
            }
        });
    }

    /** Returns how many results it remembers something of. */
    int known() {
        synchronized (memory) {
            return memory.size() + read.size();
        }
    }

    private void written(String id) {
        synchronized (memory) {
            unwritten.remove(id);
            read.remove(id);
            trim(memory, mostInMemory, unwritten);
            memory.notifyAll();
        }
    }

    /** Waits until all that was to be kept lies on disk, where it could be written. */
    public void settle() throws InterruptedException {
        synchronized (memory) {
            while (!unwritten.isEmpty() && !writer.isTerminated()) {
                memory.wait(LOOK_MILLIS);
            }
        }
    }

    /** Returns whether nothing is yet to be written. */
    public boolean isSettled() {
        synchronized (memory) {
            return unwritten.isEmpty();
        }
    }

    /** Remembers a result that was made anew, if it is still known of. */
    public void remember(String id, NodeResult result) {
        facts(id).ifPresent(facts -> hold(id, new Held(result, facts)));
    }

    private void hold(String id, Held held) {
        synchronized (memory) {
            memory.put(id, held);
            trim(memory, mostInMemory, unwritten);
        }
    }

    /** Takes out what was unused for longest. */
    private static <T> void trim(Map<String, T> map, int most, Set<String> needed) {
        Iterator<String> oldest = map.keySet().iterator();
        while (map.size() > most && oldest.hasNext()) {
            if (!needed.contains(oldest.next())) {
                oldest.remove();
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
