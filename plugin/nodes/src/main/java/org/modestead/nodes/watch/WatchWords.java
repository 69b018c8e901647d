package org.modestead.nodes.watch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.watch.Alarm;
import org.modestead.engine.watch.Look;
import org.modestead.engine.watch.Quantity;
import org.modestead.engine.watch.Reference;
import org.modestead.engine.watch.WatchResult;
import org.modestead.engine.watch.WatchedMode;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/**
 * A watch in sentences.
 *
 * @param result of it
 * @param axis of the recordings
 */
record WatchWords(WatchResult result, TimeAxis axis) {

    private static final int TOLD = 6;
    private static final double A_LITTLE_LOWER = 0.98;

    List<String> summary() {
        List<String> sentences = new ArrayList<>();
        String modes = result.modes().stream().map(WatchedMode::mode).map(this::named).collect(Collectors.joining(", "));
        sentences.add(Sentence.count(result.looks().size(), "window") + " of " + unit().span(result.length()) + " were looked at for "
                + (result.modes().size() == 1 ? "" : "modes: ") + modes + ".");
        if (result.alarms().isEmpty()) {
            sentences.add("No alarm: nothing changed by more than the model's own recordings let expect.");
        } else {
            sentences.add(Sentence.count(result.alarms().size(), "alarm") + ", each one event however long it lasts.");
            result.alarms().stream().limit(TOLD).map(this::alarm).forEach(sentences::add);
            if (result.alarms().size() > TOLD) {
                sentences.add("The alarm table tells the other " + (result.alarms().size() - TOLD) + ".");
            }
        }
        result.modes().stream().limit(TOLD).filter(mode -> mode.reference(Quantity.FREQUENCY).isPresent())
                .forEach(mode -> sentences.add(power(mode, mode.reference(Quantity.FREQUENCY).orElseThrow())));
        return sentences;
    }

    /** Returns for example {@code Mode 1 (0.620 Hz): frequency higher by 2.1 % since window 13 (1440 s), alarm from window 15 on, still lasting.} */
    String alarm(Alarm alarm) {
        Mode mode = result.modes().stream().map(WatchedMode::mode).filter(one -> one.number() == alarm.mode()).findFirst().orElseThrow();
        String lasting = alarm.ongoing() ? "still lasting" : "over with window " + (alarm.last() + 1);
        return Sentence.capital(named(mode)) + ": " + changed(alarm) + " since window " + (alarm.began() + 1) + " (" + when(alarm.began())
                + "), alarm in window " + (alarm.first() + 1) + ", " + lasting + ".";
    }

    private String changed(Alarm alarm) {
        return switch (alarm.kind()) {
            case FREQUENCY -> "frequency " + direction(alarm) + " by " + Digits.percent(Math.abs(alarm.change()));
            case DAMPING -> "damping ratio " + Digits.percent(alarm.to()) + " where it was " + Digits.percent(alarm.from());
            case SHAPE -> "shape less alike, modal assurance " + Digits.figure(alarm.to()) + " where it was " + Digits.figure(alarm.from());
            case MISSING -> "not found";
        };
    }

    private static String direction(Alarm alarm) {
        return alarm.change() < 0 ? "lower" : "higher";
    }

    private String power(WatchedMode mode, Reference reference) {
        double windows = reference.windowsToFind(A_LITTLE_LOWER * reference.figure(0));
        return Sentence.capital(named(mode.mode())) + ": a window holds " + Digits.figure(mode.cycles()) + " cycles; a frequency lower by 2 %"
                + (windows > 1000 ? " would hardly be found." : " that lasts is found after " + Digits.figure(windows)
                + " windows on the mean.");
    }

    private String named(Mode mode) {
        return "mode " + mode.number() + " (" + ModeWords.cycle(mode, unit()) + ")";
    }

    private String when(int window) {
        Look look = result.looks().get(window);
        return axis.kind() == TimeAxis.Kind.NUMBER ? unit().exactly(look.window().start()) : axis.format(look.window().start());
    }

    private TimeUnit unit() {
        return new TimeUnit(axis.unit());
    }
}
