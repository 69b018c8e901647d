package org.modestead.host.bench.run;

import java.util.Locale;
import java.util.OptionalDouble;
import org.modestead.nodes.words.Sentence;

/**
 * How a step stands.
 *
 * @param kind in one word
 * @param words for people, whole
 * @param sentence why, where there is something to be said; else empty
 * @param fraction done so far in [0, 1], of a running step
 * @param message what is being done, of a running step
 * @param secondsLeft of a running step, where that can be told
 * @param doubts of the result, 0 without one
 * @param seconds that the result took; empty without one
 */
public record StepState(Kind kind, String words, String sentence, OptionalDouble fraction, String message, OptionalDouble secondsLeft, int doubts,
        OptionalDouble seconds) {

    /** How a step stands, in one word. */
    public enum Kind {
        /** Something is wrong with its settings or links. */
        UNSET("not set up"),
        /** Can run now. */
        READY("ready"),
        /** A step before it has no result, or it has its turn later in a run. */
        WAITING("waiting"),
        /** At work. */
        RUNNING("running"),
        /** Its result belongs to what is set. */
        DONE("done"),
        /** Its last try ended with a fault. */
        FAILED("failed"),
        /** Its result belongs to other settings, inputs or files. */
        STALE("out of date"),
        /** The person stopped it. */
        STOPPED("stopped");

        private final String words;

        Kind(String words) {
            this.words = words;
        }

        /** Returns the word used in JSON. */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /** A state of which there is no more to say than why. */
    public static StepState of(Kind kind, String sentence) {
        return new StepState(kind, kind.words, sentence, OptionalDouble.empty(), "", OptionalDouble.empty(), 0, OptionalDouble.empty());
    }

    /** A step with a result. */
    public static StepState withResult(Kind kind, String sentence, int doubts, double seconds) {
        String words = doubts == 0 ? kind.words : kind.words + ", " + Sentence.count(doubts, "doubt");
        return new StepState(kind, words, sentence, OptionalDouble.empty(), "", OptionalDouble.empty(), doubts, OptionalDouble.of(seconds));
    }

    /** A step at work. */
    public static StepState running(double fraction, String message, OptionalDouble secondsLeft) {
        String left = secondsLeft.isPresent() ? ", " + Spans.words(secondsLeft.getAsDouble()) + " left" : "";
        String words = "running" + (fraction > 0 ? ", " + (int) Math.floor(100 * fraction) + " %" : "") + left;
        return new StepState(Kind.RUNNING, words, "", OptionalDouble.of(fraction), message, secondsLeft, 0, OptionalDouble.empty());
    }
}
