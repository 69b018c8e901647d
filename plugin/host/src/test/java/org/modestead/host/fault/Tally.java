package org.modestead.host.fault;

import com.sun.management.ThreadMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import org.modestead.engine.Fault;

/**
 * What came of many inputs to one reader.
 *
 * @param name of the reader
 * @param taken inputs that were read
 * @param refused inputs that were refused with a sentence
 * @param defects any other outcome, with the place of the input
 * @param mostBytes most that one input made its thread allocate
 * @param mostMillis most processor time that one input took its thread
 * @param seconds that passed in all
 */
record Tally(String name, int taken, int refused, List<String> defects, long mostBytes, long mostMillis, double seconds) {

    private static final int MOST_TOLD = 12;
    private static final ThreadMXBean THREADS = (ThreadMXBean) ManagementFactory.getThreadMXBean();

    /** Feeds a reader; inputs with another outcome than a taken or a refused one are kept in {@code target/fuzz}. */
    static Tally of(FuzzedReader reader, int inputs, long seed) throws IOException {
        Random random = new Random(seed);
        int taken = 0;
        int refused = 0;
        long mostBytes = 0;
        long mostNanos = 0;
        List<String> defects = new ArrayList<>();
        Set<String> known = new TreeSet<>();
        long thread = Thread.currentThread().getId();
        long began = System.nanoTime();
        for (int i = 0; i < inputs; i++) {
            byte[] input = reader.next(random);
            long bytes = THREADS.getThreadAllocatedBytes(thread);
            long nanos = THREADS.getCurrentThreadCpuTime();
            try {
                boolean read = reader.read(input);
                taken += read ? 1 : 0;
                refused += read ? 0 : 1;
            } catch (Fault sentence) {
                refused++;
                if (sentence.getMessage().isBlank() || sentence.getMessage().contains("Exception")) {
                    note(reader, i, input, sentence, known, defects);
                }
            } catch (Throwable defect) {
                note(reader, i, input, defect, known, defects);
            }
            mostBytes = Math.max(mostBytes, THREADS.getThreadAllocatedBytes(thread) - bytes);
            mostNanos = Math.max(mostNanos, THREADS.getCurrentThreadCpuTime() - nanos);
        }
        return new Tally(reader.name(), taken, refused, List.copyOf(defects), mostBytes, mostNanos / 1_000_000,
                (System.nanoTime() - began) / 1e9);
    }

    private static void note(FuzzedReader reader, int number, byte[] input, Throwable defect, Set<String> known, List<String> defects) throws IOException {
        StackTraceElement[] stack = defect.getStackTrace();
        String place = defect.getClass().getName() + " at " + (stack.length == 0 ? "?" : stack[0]) + " from " + List.of(stack).stream()
                .filter(frame -> frame.getClassName().startsWith("org.modestead") && !frame.getClassName().contains(".fault.")).findFirst().map(Object::toString).orElse("?");
        if (known.add(place) && defects.size() < MOST_TOLD) {
            Path kept = Files.createDirectories(Path.of("target/fuzz")).resolve(reader.name().replaceAll("[^a-z]+", "-") + "-" + number);
            Files.write(kept, input);
            defects.add(place + ": " + defect.getMessage() + " (" + kept + ")");
        }
    }

    String words() {
        return String.format(Locale.ROOT, "%-16s %8d inputs, %8d taken, %8d refused, %d defects, most memory of one %.1f MB, most time of one %d ms, %.1f s in all", name,
                taken + refused, taken, refused, defects.size(), mostBytes / 1e6, mostMillis, seconds);
    }
}
