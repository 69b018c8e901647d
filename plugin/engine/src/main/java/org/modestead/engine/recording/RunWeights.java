package org.modestead.engine.recording;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The weight of every recorded run that trains, with mean 1 over all training samples.
 *
 * @param byRun weight by the name of the recorded run
 */
record RunWeights(Map<String, Double> byRun) {

    /** A run that shows less noise than this share of the average variance counts as if it showed that: what is left may be no noise. */
    private static final double LEAST_NOISE = 1e-4;

    /** @param training pieces, weights above 0 */
    static RunWeights of(List<Piece> training, RunWeighting rule, int channels) {
        Map<String, Double> samples = new LinkedHashMap<>();
        Map<String, NoiseLevel> noise = new LinkedHashMap<>();
        Map<String, Double> given = new LinkedHashMap<>();
        for (Piece piece : training) {
            samples.merge(piece.recorded(), (double) piece.samples(Snapshots.Part.TRAINING), Double::sum);
            if (rule == RunWeighting.NOISE) {
                noise.merge(piece.recorded(), NoiseLevel.none(channels).and(piece), NoiseLevel::and);
            }
            given.put(piece.recorded(), piece.weight());
        }
        NoiseLevel pool = noise.values().stream().reduce(NoiseLevel.none(channels), NoiseLevel::and);
        Map<String, Double> weights = new LinkedHashMap<>();
        samples.forEach((run, count) -> weights.put(run, switch (rule) {
            case EQUAL_SAMPLES -> 1.0;
            case EQUAL_RUNS -> 1 / count;
            case NOISE -> 1 / Math.max(LEAST_NOISE, noise.get(run).relativeTo(pool));
            case GIVEN -> given.get(run);
        }));
        if (rule == RunWeighting.EQUAL_SAMPLES) {
            return new RunWeights(weights);
        }
        double total = samples.values().stream().mapToDouble(Double::doubleValue).sum();
        double mean = weights.entrySet().stream().mapToDouble(e -> e.getValue() * samples.get(e.getKey()) / total).sum();
        weights.replaceAll((run, weight) -> weight / mean);
        return new RunWeights(weights);
    }

    /** Returns the weight of a recorded run, 1 where it does not train. */
    double of(String recorded) {
        return byRun.getOrDefault(recorded, 1.0);
    }

    /** Returns the weights in words, for the summary. */
    String words(RunWeighting rule) {
        String how = switch (rule) {
            case EQUAL_SAMPLES -> "every sample alike";
            case EQUAL_RUNS -> "every run alike";
            case NOISE -> "by the inverse of each run's noise variance";
            case GIVEN -> "as given";
        };
        double least = byRun.values().stream().mapToDouble(Double::doubleValue).min().orElse(1);
        double most = byRun.values().stream().mapToDouble(Double::doubleValue).max().orElse(1);
        return least == most ? how : how + ", a sample counts from " + Wording.number(least) + " to " + Wording.number(most);
    }
}
