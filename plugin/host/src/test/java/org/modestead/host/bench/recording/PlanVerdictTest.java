package org.modestead.host.bench.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.host.TestWorkflows;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.Survey;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;

/**
 * What is laid out for a recording of which nothing is known comes to a sensible verdict as it stands: modes that are there with the rates
 * that the recording was made with, none where there is none. Noise is drawn anew from fixed seeds.
 */
class PlanVerdictTest {

    @TempDir
    private Path folder;

    /** What the steps as laid out say of a recording. */
    private record Said(Spectrum spectrum, Verdict verdict) {

        /** Returns the modes that carry the signal. */
        List<Mode> carrying() {
            return verdict.modes().stream().filter(ModeVerdict::counts).map(told -> mode(told.mode())).toList();
        }

        private Mode mode(int number) {
            return spectrum.modes().stream().filter(mode -> mode.number() == number).findFirst().orElseThrow();
        }

        List<Grade> grades() {
            return verdict.modes().stream().filter(ModeVerdict::counts).map(ModeVerdict::grade).distinct().toList();
        }
    }

    private Said said(String name, String head, List<String> rows) throws IOException {
        Path file = Files.writeString(folder.resolve(name), head + "\n" + String.join("\n", rows) + "\n");
        RecordingGuess guess = RecordingGuess.of(file, RecordingWish.NONE);
        assertEquals(List.of(), guess.problems());
        Survey survey = new WorkflowChecker(TestWorkflows.allNodes()).survey(RecordingPlan.workflow(guess, name, name, folder.resolve("workflow.json")));
        assertEquals(List.of(), survey.problems());
        Map<String, NodeResult> done = new HashMap<>();
        for (String id : List.of("source", "snapshots", "fit", "spectrum", "check")) {
            PlannedStep step = survey.planned().get(id);
            Map<String, Object> inputs = new HashMap<>();
            step.inputs().forEach((port, source) -> inputs.put(port, done.get(source.step()).outputs().get(source.port())));
            done.put(id, step.node().run(new NodeInputs(inputs), step.settings(), new RunContext(Progress.NONE, folder, folder)));
        }
        return new Said((Spectrum) done.get("spectrum").outputs().get("spectrum"), (Verdict) done.get("check").outputs().get("verdict"));
    }

    private static String row(double... values) {
        List<String> cells = new ArrayList<>();
        for (double value : values) {
            cells.add(value == Math.rint(value) ? Long.toString((long) value) : String.format(Locale.ROOT, "%.5f", value));
        }
        return String.join(",", cells);
    }

    /** Two sensors on an invented footbridge after a push: 1.9 Hz with 1.2 % and 5.3 Hz with 0.8 % damping. */
    @Test
    void aRingDownHasItsTwoModes() throws IOException {
        Random random = new Random(11);
        List<String> rows = new ArrayList<>();
        for (int run = 1; run <= 4; run++) {
            double first = 0.5 + random.nextDouble();
            double second = 0.5 + random.nextDouble();
            for (int k = 0; k < 300; k++) {
                double t = 0.02 * k;
                double slow = first * swing(t, 1.9, 0.012, run);
                double fast = second * swing(t, 5.3, 0.008, 2 * run);
                rows.add(row(t, run, slow + 0.6 * fast + 0.02 * random.nextGaussian(), 0.7 * slow - 0.9 * fast + 0.02 * random.nextGaussian()));
            }
        }
        Said said = said("ring-down.csv", "time [s],run,deck_a [mm/s2],deck_b [mm/s2]", rows);
        assertEquals(List.of(Grade.STANDS), said.grades());
        List<Double> frequencies = said.carrying().stream().map(mode -> Math.abs(mode.rate().im()) / (2 * Math.PI)).sorted().toList();
        assertEquals(2, frequencies.size());
        // a hundredth of a hertz: the noise of 2 % leaves some thousandths
        assertEquals(1.9, frequencies.get(0), 0.01);
        assertEquals(5.3, frequencies.get(1), 0.01);
    }

    private static double swing(double t, double frequency, double damping, double phase) {
        double turning = 2 * Math.PI * frequency;
        return Math.exp(-damping * turning * t) * Math.cos(turning * t + phase);
    }

    /** Cooling towards 20 degrees from different heats: the slow rate is told, the level at which it ends is not taken for a mode. */
    @Test
    void coolingHasItsSlowRateAndIsNotCalledAbsentForItsLevel() throws IOException {
        Random random = new Random(5);
        List<String> rows = new ArrayList<>();
        for (int run = 1; run <= 6; run++) {
            double heat = 20 + 40 * random.nextDouble();
            for (int k = 0; k < 150; k++) {
                double slow = heat * Math.exp(-0.01 * 2 * k);
                rows.add(row(2 * k, run, 20 + slow + 0.05 * random.nextGaussian(), 20 + 0.8 * slow + 0.05 * random.nextGaussian()));
            }
        }
        Said said = said("cooling.csv", "time [s],run,core [degC],shell [degC]", rows);
        assertTrue(said.grades().stream().allMatch(grade -> grade == Grade.STANDS || grade == Grade.SETTLES), said.verdict().toString());
        assertEquals(1, said.carrying().size());
        // 2 % of the rate
        assertEquals(-0.01, said.carrying().get(0).rate().re(), 0.0002);
        assertEquals(0, said.carrying().get(0).rate().im());
    }

    /** A swing whose frequency doubles while a level wanders: no mode describes it. */
    @Test
    void aDriftingSwingHasNoModeThatStands() throws IOException {
        Random random = new Random(3);
        List<String> rows = new ArrayList<>();
        double phase = 0;
        double walk = 0;
        for (int k = 0; k < 2000; k++) {
            phase += 2 * Math.PI * (0.2 + 0.2 * k / 2000) * 0.1;
            walk += 0.02 * random.nextGaussian();
            rows.add(row(0.1 * k, Math.cos(phase) + walk + 0.02 * random.nextGaussian(), Math.sin(phase) - 0.5 * walk + 0.02 * random.nextGaussian()));
        }
        Said said = said("drift.csv", "time [s],level [m],flow [m3/h]", rows);
        assertTrue(said.grades().stream().noneMatch(grade -> grade == Grade.STANDS || grade == Grade.SETTLES), said.grades().toString());
    }

    /** Lorenz's equations of convection, which have a continuous spectrum (J. Atmos. Sci. 20:130, 1963). */
    @Test
    void chaoticMotionHasNoModeThatStands() throws IOException {
        List<String> rows = new ArrayList<>();
        for (int run = 1; run <= 4; run++) {
            double[] state = {run - 2.5, 1, 20 + run};
            for (int k = -200; k < 400; k++) {
                for (int i = 0; i < 8; i++) {
                    state = convection(state, 0.0025);
                }
                if (k >= 0) {
                    rows.add(row(0.02 * k, run, state[0], state[1], state[2]));
                }
            }
        }
        Said said = said("chaos.csv", "time [s],run,roll [mm/s],side [K],rise [K]", rows);
        assertTrue(said.grades().stream().noneMatch(grade -> grade == Grade.STANDS || grade == Grade.SETTLES), said.grades().toString());
    }

    /** One step by the midpoint rule. */
    private static double[] convection(double[] s, double h) {
        double[] slope = slope(s);
        double[] middle = slope(new double[] {s[0] + h / 2 * slope[0], s[1] + h / 2 * slope[1], s[2] + h / 2 * slope[2]});
        return new double[] {s[0] + h * middle[0], s[1] + h * middle[1], s[2] + h * middle[2]};
    }

    private static double[] slope(double[] s) {
        return new double[] {10 * (s[1] - s[0]), s[0] * (28 - s[2]) - s[1], s[0] * s[1] - 8.0 / 3 * s[2]};
    }
}
