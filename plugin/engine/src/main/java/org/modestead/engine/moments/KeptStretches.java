package org.modestead.engine.moments;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * The stretches of one part with the smallest draws, as many as fit: the longest head of all stretches in the order of their draws that has
 * at most so many samples. What was turned away once stays away, so the result does not depend on the order of reading.
 *
 * @param part that is kept
 * @param most samples
 * @param kept in the order of their draws
 * @param cutoff smallest draw (unsigned) that was turned away; stretches of this draw or above are not kept
 * @param samples offered in all
 */
public record KeptStretches(Part part, int most, List<KeptStretch> kept, OptionalLong cutoff, long samples) {

    /** Takes an immutable copy. */
    public KeptStretches {
        kept = List.copyOf(kept);
    }

    static KeptStretches none(Part part, int most) {
        return new KeptStretches(part, most, List.of(), OptionalLong.empty(), 0);
    }

    /** Returns whether a stretch of this draw would be kept as far as is known. */
    boolean wants(long draw) {
        return cutoff.isEmpty() || Long.compareUnsigned(draw, cutoff.getAsLong()) < 0;
    }

    /** Returns this with one more stretch. */
    KeptStretches with(KeptStretch stretch) {
        return merged(List.of(stretch), OptionalLong.empty(), stretch.samples());
    }

    /** Returns this with so many samples that are not to be kept. */
    KeptStretches passed(long more) {
        return new KeptStretches(part, most, kept, cutoff, samples + more);
    }

    /** Returns what is kept of both together. */
    public KeptStretches plus(KeptStretches other) {
        return merged(other.kept, other.cutoff, other.samples);
    }

    private KeptStretches merged(List<KeptStretch> more, OptionalLong otherCutoff, long moreSamples) {
        List<KeptStretch> all = new ArrayList<>(kept);
        all.addAll(more);
        all.sort(KeptStretch.BY_DRAW);
        OptionalLong limit = smaller(cutoff, otherCutoff);
        List<KeptStretch> head = new ArrayList<>();
        long used = 0;
        for (KeptStretch stretch : all) {
            used += stretch.samples();
            boolean below = limit.isEmpty() || Long.compareUnsigned(stretch.draw(), limit.getAsLong()) < 0;
            if (below && used <= most) {
                head.add(stretch);
            } else if (below) {
                limit = OptionalLong.of(stretch.draw());
            }
        }
        OptionalLong last = limit;
        head.removeIf(stretch -> last.isPresent() && Long.compareUnsigned(stretch.draw(), last.getAsLong()) >= 0);
        return new KeptStretches(part, most, head, limit, samples + moreSamples);
    }

    private static OptionalLong smaller(OptionalLong a, OptionalLong b) {
        if (a.isEmpty() || b.isEmpty()) {
            return a.isEmpty() ? b : a;
        }
        return Long.compareUnsigned(a.getAsLong(), b.getAsLong()) <= 0 ? a : b;
    }
}
