package org.modestead.host.cli;

import java.io.PrintStream;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.StepOutcome;

/**
 * Shows how a run goes on the error stream: one line that is overwritten where a person watches, otherwise a plain line
 * when a step begins and ends.
 */
final class ProgressLine implements RunListener, AutoCloseable {

    private static final int WIDTH = 78;
    private static final long NANOS_BETWEEN = TimeUnit.MILLISECONDS.toNanos(100);

    private final PrintStream err;
    private final boolean live;
    private final int steps;
    private final Map<String, String> running = new TreeMap<>();
    private int finished;
    private long drawn;
    private boolean open;

    ProgressLine(Terminal terminal, int steps) {
        this.err = terminal.err();
        this.live = terminal.live();
        this.steps = steps;
    }

    @Override
    public synchronized void told(String sentence) {
        clear();
        err.println(sentence);
    }

    @Override
    public synchronized void started(String step) {
        running.put(step, step);
        if (live) {
            draw();
        } else {
            err.println(step + ": started");
        }
    }

    @Override
    public synchronized void progress(String step, double fraction, String message) {
        running.put(step, String.format(Locale.ROOT, "%s %d %% %s", step, Math.round(100 * fraction), message));
        if (live && System.nanoTime() - drawn > NANOS_BETWEEN) {
            draw();
        }
    }

    @Override
    public synchronized void ended(String step, StepOutcome outcome) {
        running.remove(step);
        finished++;
        clear();
        if (!live || outcome instanceof StepOutcome.Failed) {
            err.println(step + ": " + outcome.word() + time(outcome));
        }
        if (live && !running.isEmpty()) {
            draw();
        }
    }

    private static String time(StepOutcome outcome) {
        if (!(outcome instanceof StepOutcome.Done done)) {
            return "";
        }
        return done.cached() ? " (unchanged, taken from the run before)"
                : String.format(Locale.ROOT, " in %.1f s", done.time().toMillis() / 1000.0);
    }

    private void draw() {
        String line = "[" + finished + "/" + steps + "] " + String.join(", ", running.values());
        err.print("\r" + padded(line));
        err.flush();
        drawn = System.nanoTime();
        open = true;
    }

    private void clear() {
        if (open) {
            err.print("\r" + padded("") + "\r");
            err.flush();
            open = false;
        }
    }

    private static String padded(String line) {
        String cut = line.length() > WIDTH ? line.substring(0, WIDTH - 3) + "..." : line;
        return cut + " ".repeat(WIDTH - cut.length());
    }

    @Override
    public synchronized void close() {
        clear();
    }
}
