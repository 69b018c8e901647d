package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.modestead.engine.operator.ObservedRun;

/**
 * What is drawn with replacement: whole runs where there are at least {@value #ENOUGH_RUNS}, blocks of neighbouring
 * observations otherwise (what lies between two gaps counts as a run). Runs are independent of each other whatever happens
 * within them; blocks must be longer than the noise remembers.
 *
 * <p>Blocks start anywhere on the circle of all observations (circular block bootstrap, Politis and Romano, in LePage and
 * Billard, eds., <i>Exploring the Limits of Bootstrap</i>, Wiley 1992; after Künsch, Ann. Statist. 17:1217, 1989). They are made
 * of {@value #CELLS} cells each, whose sums are kept.
 *
 * @param cells sums of runs, or of cells of neighbouring observations in order
 * @param together cells that are drawn together, 1 for runs
 * @param units number of runs, or of blocks that cover the observations once: the independent pieces behind an interval
 * @param wholeRuns whether runs are drawn, not blocks
 * @param words what is drawn, for the report
 */
record Resampling(List<Moments> cells, int together, double units, boolean wholeRuns, String words) {

    static final int ENOUGH_RUNS = 8;
    private static final int CELLS = 4;
    private static final int MOST_CELLS = 400;
    private static final int LEAST_BLOCKS = 12;

    /**
     * Cuts observations into what is drawn.
     *
     * @param runs observations by run, in the functions of the frame
     * @param memory observations that share recorded samples with each other, at least 1
     */
    static Resampling of(List<ObservedRun> runs, int memory) {
        if (runs.size() >= ENOUGH_RUNS) {
            return ofRuns(runs);
        }
        int total = runs.stream().mapToInt(ObservedRun::count).sum();
        int wanted = Math.max((int) Math.ceil(Math.cbrt(total)), 2 * memory);
        int block = Math.max(1, Math.min(wanted, total / LEAST_BLOCKS));
        int cell = Math.max(Math.max(1, block / CELLS), (total + MOST_CELLS - 1) / MOST_CELLS);
        int together = Math.max(1, Math.round((float) block / cell));
        List<Moments> cells = new ArrayList<>();
        for (ObservedRun run : runs) {
            int count = Math.max(1, Math.round((float) run.count() / cell));
            for (int k = 0; k < count; k++) {
                cells.add(Moments.of(run.rows(run.count() * k / count, run.count() * (k + 1) / count)));
            }
        }
        return new Resampling(List.copyOf(cells), together, (double) cells.size() / together, false,
                String.format(Locale.ROOT, "blocks of %d of %d observations", together * cell, total));
    }

    private static Resampling ofRuns(List<ObservedRun> runs) {
        int groups = Math.min(runs.size(), MOST_CELLS);
        List<Moments> cells = new ArrayList<>();
        for (int g = 0; g < groups; g++) {
            List<Moments> group = new ArrayList<>();
            for (int k = runs.size() * g / groups; k < runs.size() * (g + 1) / groups; k++) {
                group.add(Moments.of(runs.get(k)));
            }
            double[] once = new double[group.size()];
            Arrays.fill(once, 1);
            cells.add(group.size() == 1 ? group.get(0) : Moments.sum(group, once));
        }
        return new Resampling(List.copyOf(cells), 1, groups, true, String.format(Locale.ROOT, "whole runs, %d of them", runs.size()));
    }

    /** Draws how often each cell occurs in a replicate. */
    double[] draw(Random random) {
        double[] times = new double[cells.size()];
        for (int drawn = 0; drawn < times.length; drawn += together) {
            int start = random.nextInt(times.length);
            for (int k = 0; k < Math.min(together, times.length - drawn); k++) {
                times[(start + k) % times.length]++;
            }
        }
        return times;
    }
}
