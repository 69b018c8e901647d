package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What goes wrong, is taken back or is changed, in the real engine. */
class TroubleTest {

    private static final String COLUMN_FILTER = "org.knime.base.node.preproc.filter.column.DataColumnSpecFilterNodeFactory";
    private static final String KEPT = "column-filter/included_names";
    private static final long A_SECOND = 1000;

    @TempDir
    Path folder;
    private PlatformHome home;
    private Platform platform;

    @BeforeEach
    void startThePlatform() throws Exception {
        home = PlatformHome.givenOrSkipped();
        platform = Platform.start(home, folder.resolve("platform"));
    }

    @AfterEach
    void endThePlatform() throws Exception {
        if (platform != null) {
            platform.close();
        }
    }

    @Test
    void wrongSettingsAreRefusedWithASentenceAndTheOldOnesStay() throws Exception {
        platform.ask("create", folder.resolve("wrong"));
        int fit = platform.node("operator-fitter");
        platform.ask("set", fit, "rank-rule", "text", "fixed", "rank", "whole", 9);
        String before = platform.ask("settings", fit).get(0);
        for (List<Object> wrong : List.<List<Object>>of(List.of("rank", "whole", -3), List.of("rank-rule", "text", "guess"),
                List.of("rank", "text", "nine"))) {
            Platform.Answer answer = platform.tried("set", fit, wrong);
            assertFalse(answer.ok(), "accepted " + wrong);
            assertEquals("org.knime.core.node.InvalidSettingsException", answer.field(0));
            assertTrue(answer.field(1).contains(wrong.get(2).toString()) && answer.field(1).endsWith("."), answer.field(1));
        }
        assertEquals(before, platform.ask("settings", fit).get(0));
        assertEquals(List.of(), platform.problemsLogged());
    }

    @Test
    void aColumnThatVanishedIsNamedBeforeAnythingRuns() throws Exception {
        platform.ask("create", folder.resolve("vanished"));
        int station = platform.node("signal-generator");
        int filter = platform.node(COLUMN_FILTER);
        int snapshots = platform.node("snapshot-builder");
        platform.ask("link", station, 1, filter, 1);
        platform.ask("link", filter, 1, snapshots, 1);
        platform.ask("set", snapshots, "time-column", "text", "time", "run-column", "text", "run", "channels", "texts", "flow [m3/h]|sump_level [m]");
        platform.ask("set", filter, KEPT, "texts", "run|time|flow [m3/h]|sump_level [m]");
        assertEquals("configured", platform.state(snapshots).word(), platform.state(filter) + " " + platform.state(snapshots));
        platform.ask("set", filter, KEPT, "texts", "run|time|sump_level [m]", "column-filter/enforce_option", "text", "EnforceInclusion");
        Platform.State state = platform.state(snapshots);
        assertEquals("idle", state.word(), state.toString());
        assertTrue(state.message().contains("flow [m3/h]") && !state.message().contains("Exception"), state.toString());
        assertEquals(List.of(), platform.problemsLogged());
    }

    @Test
    void aNodeThatIsResetAndChangedGivesWhatTheHostGivesForThatSetting() throws Exception {
        Path file = NodesTest.everyNode(folder);
        HostRun host = HostRun.of(file, folder.resolve("host"));
        HostRun changed = HostRun.of(file, folder.resolve("changed"), "fit.rank=5");
        PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), folder.resolve("workflow"));
        int fit = built.numbers().get("fit");
        platform.ask("start", built.numbers().get("spectrum"));
        platform.ask("await", 300);
        List<String> first = built.table(platform, "spectrum", "modes", folder.resolve("first"));
        assertEquals(host.tables().get("spectrum.modes"), first);
        platform.ask("reset", fit);
        assertEquals("configured", platform.state(fit).word());
        assertEquals("configured", platform.state(built.numbers().get("spectrum")).word(), "what follows is reset too");
        assertEquals("executed", platform.state(built.numbers().get("snapshots")).word(), "what comes before is not");
        platform.ask("set", fit, "rank", "whole", 5);
        platform.ask("start", built.numbers().get("spectrum"));
        platform.ask("await", 300);
        List<String> second = built.table(platform, "spectrum", "modes", folder.resolve("second"));
        assertEquals(changed.tables().get("spectrum.modes"), second);
        assertNotEquals(first, second);
        assertEquals(List.of(), platform.problemsLogged());
    }

    /** The machine may be busy with something else: the least of three tries is taken. */
    @Test
    void cancellingStopsWithinASecondAndLeavesTheNodeReady() throws Exception {
        platform.ask("create", folder.resolve("cancelled"));
        int station = platform.node("signal-generator");
        int snapshots = platform.node("snapshot-builder");
        int fit = platform.node("operator-fitter");
        int spectrum = platform.node("spectrum-extractor");
        int check = platform.node("wellposedness-checker");
        platform.ask("link", station, 1, snapshots, 1);
        platform.ask("set", snapshots, "time-column", "text", "time", "run-column", "text", "run", "resampling", "text", "uniform", "step",
                "number", 0.05, "scaling", "text", "std", "detrend", "text", "mean", "delay-depth", "whole", 20, "holdout", "text",
                "run-share", "holdout-run-share", "number", 0.2);
        platform.ask("link", snapshots, 1, fit, 1);
        platform.ask("set", fit, "estimator", "text", "linear");
        platform.ask("link", fit, 1, spectrum, 1);
        platform.ask("link", snapshots, 1, check, 1);
        platform.ask("link", fit, 1, check, 2);
        platform.ask("link", spectrum, 1, check, 3);
        platform.ask("start", spectrum);
        assertEquals(List.of("true"), platform.ask("await", 300));
        assertEquals("executed", platform.state(spectrum).word(), platform.state(spectrum).toString());
        List<Long> taken = new ArrayList<>();
        for (int i = 0; i < 3; i++) {
            platform.ask("start", check);
            while (!platform.state(check).word().equals("executing")) {
                assertNotEquals("executed", platform.state(check).word(), "it was done before it could be cancelled");
                Thread.sleep(20);
            }
            Thread.sleep(400 + 300 * i);
            taken.add(Long.parseLong(platform.ask("cancel", check).get(0)));
            assertEquals("configured", platform.state(check).word(), platform.state(check).toString());
        }
        System.out.println("Cancelling the Well-posedness Checker took " + taken + " ms.");
        assertTrue(Collections.max(taken) <= A_SECOND, taken + " ms");
        assertEquals(List.of(), platform.problemsLogged());
    }
}
