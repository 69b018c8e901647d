package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionContext;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortZips;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.knime.port.KernelPort;
import org.modestead.knime.port.ModelPort;
import org.modestead.knime.port.OperatorPort;
import org.modestead.knime.port.SnapshotsPort;
import org.modestead.knime.port.SpectrumPort;
import org.modestead.knime.port.StagePort;
import org.modestead.knime.port.StageSpec;
import org.modestead.knime.port.VerdictPort;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.ResultFile;

/** Native nodes one after the other; {@link Rig#run} checks at every step that the specs told before running are those that come out. */
class ChainTest {

    private static Chain chain;

    @BeforeAll
    static void runOnce() throws Exception {
        chain = Chain.run();
    }

    @Test
    void everyTypedPortIsToldBeforeRunningWithChannelsUnitsAndTimes() throws Exception {
        StageSpec spec = ((SnapshotsPort) chain.out("snapshot-builder", "snapshots")).getSpec();
        assertEquals(8, spec.outlook().channels().size());
        assertEquals("s", spec.outlook().time().orElseThrow().unit());
        PortObjectSpec[] told = chain.rig("spectrum-extractor").engine().configure(chain.out("operator-fitter", "operator").getSpec());
        assertEquals(new StageSpec(PortType.SPECTRUM, spec.outlook()), told[0]);
    }

    @Test
    void everyPortComesBackFromItsFileEqualWithTheSameBytes() throws Exception {
        SnapshotsPort snapshots = (SnapshotsPort) chain.out("snapshot-builder", "snapshots");
        assertEquals(snapshots, PortZips.again(new SnapshotsPort.Serializer(), snapshots));
        KernelPort kernel = (KernelPort) chain.out("kernel-chooser", "kernel");
        assertEquals(kernel, PortZips.again(new KernelPort.Serializer(), kernel));
        OperatorPort operator = (OperatorPort) chain.out("operator-fitter", "operator");
        assertEquals(operator, PortZips.again(new OperatorPort.Serializer(), operator));
        SpectrumPort spectrum = (SpectrumPort) chain.out("spectrum-extractor", "spectrum");
        assertEquals(spectrum, PortZips.again(new SpectrumPort.Serializer(), spectrum));
        VerdictPort verdict = (VerdictPort) chain.out("wellposedness-checker", "verdict");
        assertEquals(verdict, PortZips.again(new VerdictPort.Serializer(), verdict));
    }

    @Test
    void specsComeBackFromTheirFiles() throws Exception {
        StageSpec known = ((SnapshotsPort) chain.out("snapshot-builder", "snapshots")).getSpec();
        assertEquals(known, PortZips.again(new StageSpec.Serializer(), known));
        StageSpec unknown = new StageSpec(PortType.KERNEL, Outlook.NONE);
        assertEquals(unknown, PortZips.again(new StageSpec.Serializer(), unknown));
    }

    @Test
    void everyPortHasASummaryThatNamesItsType() {
        chain.all().values().stream().flatMap(Arrays::stream).filter(StagePort.class::isInstance).map(StagePort.class::cast)
                .forEach(port -> assertTrue(port.getSummary().startsWith(port.content().spec().type().title() + ": "), port.getSummary()));
    }

    @Test
    void theVerdictIsAFlowVariableAndWarnsUnlessModesStand() {
        Verdict verdict = (Verdict) ((VerdictPort) chain.out("wellposedness-checker", "verdict")).content().value();
        Rig rig = chain.rig("wellposedness-checker");
        assertEquals(verdict.overall().grade().word(), rig.engine().variables().get("modestead-verdict"));
        boolean stands = List.of("stands", "settles").contains(verdict.overall().grade().word());
        assertEquals(!stands, rig.engine().warning().orElse("").startsWith("Verdict " + verdict.overall().grade().word() + ": "));
    }

    @Test
    void missingCellsAreCountedInTheWarning() {
        String warning = chain.rig("snapshot-builder").engine().warning().orElse("");
        assertTrue(warning.matches("(?s)Missing cells: \\d+ of .*"), warning);
    }

    @Test
    void theViewsResultSurvivesReloadAndNotReset(@TempDir Path folder) throws Exception {
        Rig done = chain.rig("forecast");
        done.engine().save(folder.toFile());
        Rig reloaded = Rig.of("forecast");
        reloaded.engine().load(folder.toFile());
        ResultFile before = done.model().shown().orElseThrow();
        ResultFile after = reloaded.model().shown().orElseThrow();
        assertEquals(before.summary(), after.summary());
        assertEquals(before.doubts(), after.doubts());
        assertEquals(before.figures().stream().map(figure -> figure.id() + figure.title()).toList(),
                after.figures().stream().map(figure -> figure.id() + figure.title()).toList());
        reloaded.engine().reset();
        assertTrue(reloaded.model().shown().isEmpty());
        assertArrayEquals(new String[] {"result.zip"}, folder.toFile().list(), "one file in the open format");
    }

    @Test
    void aNodeThatNeverRanSavesAndLoadsNothing(@TempDir Path folder) throws Exception {
        Rig.of("forecast").engine().save(folder.toFile());
        assertArrayEquals(new String[0], folder.toFile().list());
        Rig rig = Rig.of("forecast");
        rig.engine().load(folder.toFile());
        assertTrue(rig.model().shown().isEmpty());
    }

    @Test
    void runningAgainGivesTheSameBytes() throws Exception {
        PortObject[] again = chain.rig("spectrum-extractor").run(chain.out("operator-fitter", "operator"));
        assertArrayEquals(PortZips.bytes(new SpectrumPort.Serializer(), (SpectrumPort) chain.out("spectrum-extractor", "spectrum")),
                PortZips.bytes(new SpectrumPort.Serializer(), (SpectrumPort) again[0]));
    }

    @Test
    void aCancelledRunEndsAsCancelled() throws Exception {
        ExecutionContext exec = new ExecutionContext();
        exec.cancel();
        Rig rig = Rig.of("snapshot-builder").with(Chain.SNAPSHOTS);
        assertThrows(CanceledExecutionException.class, () -> rig.engine().execute(exec, chain.out("signal-generator", "table")));
    }

    /** A person may ask to stop at any time: while rows are read, while numbers are crunched, while tables are written. */
    @Test
    void everyNodeAsksWhetherToStopAndStopsThen() throws Exception {
        for (String id : chain.all().keySet()) {
            Rig rig = Rig.of(id);
            rig.engine().settings(chain.rig(id).engine().saved());
            CountingContext all = new CountingContext(Integer.MAX_VALUE);
            rig.engine().execute(all, chain.inputs(id));
            assertTrue(all.asked() > 1, id + " asked " + all.asked() + " times");
            // while it waits for the work the bridge asks on its own account, more or less often
            for (int stopAt : new int[] {1, Math.max(1, all.asked() / 2)}) {
                assertThrows(CanceledExecutionException.class, () -> rig.engine().execute(new CountingContext(stopAt), chain.inputs(id)), id);
            }
        }
    }

    /** Counts how often it is asked whether to stop, and says yes from one time on. */
    private static final class CountingContext extends ExecutionContext {
        private final AtomicInteger asked = new AtomicInteger();
        private final int stopAt;

        CountingContext(int stopAt) {
            super();
            this.stopAt = stopAt;
        }

        int asked() {
            return asked.get();
        }

        @Override
        public void checkCanceled() throws CanceledExecutionException {
            if (asked.incrementAndGet() >= stopAt) {
                throw new CanceledExecutionException();
            }
        }
    }

    @Test
    void aVanishedColumnFailsBeforeRunningByName() throws Exception {
        Rig rig = Rig.of("snapshot-builder").with(Map.of("time-column", "clock"));
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class,
                () -> rig.engine().configure(chain.out("signal-generator", "table").getSpec()));
        assertTrue(refused.getMessage().startsWith("Setting \"Time column\": the input has no column clock; choose a column"),
                refused.getMessage());
    }

    @Test
    void aColumnOfTheWrongTypeFailsBeforeRunningByName() throws Exception {
        Rig rig = Rig.of("snapshot-builder").with(Map.of("time-column", "beyond"));
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class,
                () -> rig.engine().configure(chain.out("forecast", "forecast").getSpec()));
        assertTrue(refused.getMessage().contains("the column beyond holds true/false"), refused.getMessage());
    }

    @Test
    void settingsAtOddsFailBeforeRunning() throws Exception {
        Rig rig = Rig.of("snapshot-builder").with(Map.of("time-column", "time", "channels", List.of("time")));
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class,
                () -> rig.engine().configure(chain.out("signal-generator", "table").getSpec()));
        assertTrue(refused.getMessage().contains("give each column one part"), refused.getMessage());
    }

    /** Fit in one session, go on in another. */
    @Test
    void aModelIsWrittenReadAndApplied(@TempDir Path folder) throws Exception {
        String file = folder.resolve("pumps.zip").toString();
        PortObject[] written = Rig.of("model-writer").with(Map.of("file", file)).run(chain.out("operator-fitter", "operator"),
                chain.out("spectrum-extractor", "spectrum"), chain.out("wellposedness-checker", "verdict"));
        PortObject[] read = Rig.of("model-reader").with(Map.of("file", file)).run();
        assertEquals(written[0], read[0]);
        assertEquals(written[0], PortZips.again(new ModelPort.Serializer(), (ModelPort) read[0]));
        PortObject[] applied = Rig.of("model-applier").run(read[0], null);
        assertEquals(chain.out("operator-fitter", "operator"), applied[1]);
        assertEquals(chain.out("spectrum-extractor", "spectrum"), applied[2]);
    }

    @Test
    void aModelFileThatIsNotThereFailsBeforeRunning(@TempDir Path folder) throws Exception {
        Rig rig = Rig.of("model-reader").with(Map.of("file", folder.resolve("gone.zip").toString()));
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class, () -> rig.engine().configure());
        assertTrue(refused.getMessage().contains("there is no such file"), refused.getMessage());
    }

    @Test
    void optionalInputsMayStayUnconnected() throws Exception {
        PortObject[] outputs = Rig.of("operator-fitter").with(Map.of("estimator", "linear")).run(chain.out("snapshot-builder", "snapshots"), null);
        assertInstanceOf(OperatorPort.class, outputs[0]);
        assertInstanceOf(BufferedDataTable.class, outputs[1]);
    }
}
