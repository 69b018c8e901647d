package org.modestead.nodes.words;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;

class WordsTest {

    @ParameterizedTest
    @EnumSource(Grade.class)
    void everyVerdictIsToldInWholeSentences(Grade grade) {
        for (String sentence : List.of(VerdictWords.meaning(grade), VerdictWords.overall(grade),
                VerdictWords.advice(grade))) {
            assertTrue(Character.isUpperCase(sentence.charAt(0)) && sentence.endsWith("."), sentence);
        }
        assertTrue(VerdictWords.advice(grade).contains(grade.advice()));
        assertTrue(VerdictWords.verb(grade).contains(grade.word()));
    }

    @Test
    void aModeThatSettlesIsAdvisedByTheChecksThatDecidedAndByNoOther() {
        assertEquals("What may be done: report the mode together with how well it keeps its rule.", settled(1, "close-residual"));
        assertEquals("What may be done: report the mode together with its overlap with other modes, and with how far noise blurs it.",
                settled(1, "eigenfunction-overlap", "joint-solo-gap", "noise-sensitivity"));
        assertEquals("What may be done: report the mode together with how much of the signal the space does not hold.",
                settled(1, "signal-in-space"));
        // all modes together may be limited each by something else
        assertEquals(VerdictWords.advice(Grade.SETTLES), settled(0, "close-residual"));
    }

    private static String settled(int mode, String... decidedBy) {
        return VerdictWords.advice(new ModeVerdict(mode, Grade.SETTLES, List.of(decidedBy), true, ""));
    }

    @Test
    void noTwoVerdictsAreToldAlike() {
        List<Function<Grade, String>> texts = List.of(VerdictWords::meaning, VerdictWords::overall, VerdictWords::headline,
                VerdictWords::verb);
        for (Function<Grade, String> text : texts) {
            Set<String> told = new HashSet<>(Arrays.stream(Grade.values()).map(text).toList());
            assertEquals(Grade.values().length, told.size());
        }
    }

    @Test
    void frequenciesAreHertzOnlyForSeconds() {
        assertEquals("Hz", new TimeUnit("s").frequency());
        assertEquals("cycles/d", new TimeUnit("d").frequency());
        assertEquals("cycles/time unit", new TimeUnit("").frequency());
        assertEquals("1/time unit", new TimeUnit("").rate());
        assertEquals("12.3 time units", new TimeUnit("").span(12.34));
    }

    @Test
    void aModeIsToldByWhatAnEngineerAsksFor() {
        TimeUnit seconds = new TimeUnit("s");
        // λ = -ζω ± iω sqrt(1 - ζ²) with ω = 2π 1.52 rad/s and ζ = 0.018; closed form.
        double omega = 2 * Math.PI * 1.52 / Math.sqrt(1 - 0.018 * 0.018);
        assertEquals("1.52 Hz, damping ratio 1.8 %", ModeWords.headline(mode(-0.018 * omega, 2 * Math.PI * 1.52), seconds));
        assertEquals("no oscillation, halves every 2.00 s", ModeWords.headline(mode(-Math.log(2) / 2, 0), seconds));
        assertEquals("no oscillation, doubles every 4.00 s", ModeWords.headline(mode(Math.log(2) / 4, 0), seconds));
        assertEquals("no oscillation, neither grows nor decays", ModeWords.headline(mode(0, 0), seconds));
        assertEquals("one cycle every 364 s, next to no damping",
                ModeWords.headline(mode(-1e-6, 2 * Math.PI / 364), seconds));
        assertEquals("gone within one step", ModeWords.headline(mode(Double.NEGATIVE_INFINITY, 0), seconds));
        assertTrue(ModeWords.headline(mode(Math.log(2), 6), seconds).endsWith("growing: doubles every 1.00 s"));
    }

    @Test
    void sentencesBeginLargeAndEndWithOneStop() {
        assertEquals("The weight doubled.", Sentence.of("the weight doubled"));
        assertEquals("The weight doubled.", Sentence.of(" The weight doubled. "));
        assertEquals("", Sentence.of(" "));
        assertEquals("1 run", Sentence.count(1, "run"));
        assertEquals("0 runs", Sentence.count(0, "run"));
    }

    private static Mode mode(double growth, double turn) {
        return new Mode(1, List.of(0), new Complex(growth, turn), 1, 1, 0, List.of(), false, 0);
    }

    @Test
    void headlinesTellIntervalsWhereThereAreSome() {
        Mode ringing = mode(-0.1719, 9.55).with(new ModeIntervals(0.9, new Interval(-0.25, -0.1),
                new Interval(2 * Math.PI * 1.5, 2 * Math.PI * 1.54), new Interval(0.01, 0.026), Interval.UNKNOWN));
        assertEquals("1.52 Hz (1.50 to 1.54), damping ratio 1.8 % (1.0 % to 2.6 %)", ModeWords.headline(ringing, new TimeUnit("s")));
        Mode slow = mode(-0.01, 0.1).with(new ModeIntervals(0.9, new Interval(-0.02, 0), new Interval(0, 0.2), new Interval(0, 0.2),
                Interval.UNKNOWN));
        assertEquals("one cycle every 62.8 s, damping ratio 10 % (0 % to 20 %)", ModeWords.headline(slow, new TimeUnit("s")));
    }

    @Test
    void digitsAreSoManyThatAnIntervalIsSeen() {
        assertEquals("1.52 Hz (1.50 to 1.54)", new Estimate(1.52, new Interval(1.5, 1.54)).figure("Hz"));
        assertEquals("2.00 % (1.96 % to 2.04 %)", new Estimate(0.02, new Interval(0.0196, 0.0204)).percent());
        assertEquals("0.62000 (0.61998 to 0.62002)", new Estimate(0.62, new Interval(0.61998, 0.62002)).figure());
        assertEquals("364.0 s (363.8 s to 364.2 s)", new Estimate(364, new Interval(363.8, 364.2)).span("s"));
        assertEquals("\u22120.172 (\u22120.250 to \u2013)", new Estimate(-0.1719, new Interval(-0.25, Double.NaN)).figure(), "an end is not known");
        assertEquals("1.52", new Estimate(1.52, Interval.UNKNOWN).figure());
        assertEquals("1.52 Hz (to all digits shown)", new Estimate(1.52, new Interval(1.52, 1.52 + 1e-9)).figure("Hz"), "more than six digits help nobody");
        assertEquals("0 (to all digits shown)", new Estimate(0, new Interval(0, 0)).figure());
    }
}
