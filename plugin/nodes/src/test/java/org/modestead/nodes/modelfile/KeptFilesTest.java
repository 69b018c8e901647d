package org.modestead.nodes.modelfile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.InputStream;
import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.testing.Steps;

/** Files written by earlier versions are read for ever; {@link WriteFixtureFilesTest} wrote them. None of them is ever replaced. */
class KeptFilesTest {

    // another processor's exp and sin differ in the last place, which eigenvalues of these sizes enlarge some thousand times
    private static final double ANOTHER_MACHINE = 1e-9;

    @ParameterizedTest
    @ValueSource(strings = {"v1-linear", "v1-stable", "v1-extrapolated", "v1-fourier", "v1-sections", "v1-landmarks", "v1-generator", "v1-driven"})
    void aKeptFileHoldsWhatItHeldWhenItWasWritten(String name) throws Exception {
        try (InputStream file = KeptFilesTest.class.getResourceAsStream(name + ".zip");
                InputStream lines = KeptFilesTest.class.getResourceAsStream(name + ".txt")) {
            Model model = (Model) PortFiles.read(PortType.MODEL, file);
            assertEquals(new String(lines.readAllBytes(), StandardCharsets.UTF_8).lines().toList(), lines(model));
            Spectrum now = (Spectrum) Steps.run("spectrum-extractor", Map.of("operator", model.operator()), Map.of("intervals", "none")).outputs()
                    .get("spectrum");
            for (int j = 0; j < now.rank(); j++) {
                Complex stored = model.spectrum().eigenvalues().get(j);
                assertTrue(now.eigenvalues().get(j).minus(stored).abs() <= ANOTHER_MACHINE * Math.max(1, stored.abs()), name + " " + j);
            }
        }
    }

    /** What was read, with every rate and grade. */
    static List<String> lines(Model model) {
        FittedOperator operator = model.operator();
        Snapshots snapshots = operator.snapshots();
        List<String> out = new ArrayList<>(List.of(model.name(), model.notes(), operator.method(), operator.rankChoice()));
        out.add("rank " + operator.rank() + " of " + operator.compression().rank() + ", ridge " + digits(operator.ridge()));
        out.add("estimator " + operator.estimator().id() + ", " + operator.compression().functions() + " functions");
        out.add("channels " + snapshots.channels().stream().map(Channel::label).toList() + ", inputs "
                + snapshots.inputs().stream().map(Channel::label).toList());
        out.add("delays " + snapshots.delay().depth() + " x " + snapshots.delay().spacing() + ", step " + digits(snapshots.step().orElse(Double.NaN)));
        for (Snapshots.Part part : Snapshots.Part.values()) {
            snapshots.runs(part).forEach(run -> out.add("run " + run.id() + " of " + part + ": " + run.samples() + ", weight " + digits(run.weight())
                    + ", last " + digits(snapshots.preparation().restore(0, run.times()[run.samples() - 1], run.values().get(run.samples() - 1, 0)))));
        }
        model.spectrum().modes().forEach(mode -> out.add("mode " + mode.number() + ": " + digits(mode.rate().re()) + " " + digits(mode.rate().im())
                + ", share " + digits(mode.energyShare()) + ", frequency from "
                + digits(mode.intervals().map(intervals -> intervals.frequency().low()).orElse(Double.NaN)) + ", "
                + model.verdict().of(mode.number()).orElseThrow().grade()));
        out.add(model.verdict().overall().sentence());
        out.add("findings " + model.verdict().findings().size() + ", rows of the ladder " + model.verdict().ladder().size());
        return out;
    }

    /** Written alike by every Java. */
    private static String digits(double value) {
        return Double.isFinite(value) ? new BigDecimal(value).round(new MathContext(12)).toString() : Double.toString(value);
    }
}
