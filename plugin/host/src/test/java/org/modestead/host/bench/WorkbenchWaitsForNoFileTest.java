package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.FakeNode;
import org.modestead.host.WaitingNode;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.host.bench.desk.LabelEdit;
import org.modestead.host.bench.desk.SettingEdit;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.bench.run.ResultFolder;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.TableSchema;

/** While one step's settings are being checked, which may mean reading a large file, a run goes on, is told of and can be stopped. */
class WorkbenchWaitsForNoFileTest {

    @TempDir
    private Path folder;

    /** Level 2 is checked for as long as the test likes. */
    private record SlowlyChecked(FakeNode node, CountDownLatch checking, CountDownLatch go) implements Node {
        @Override
        public NodeDeclaration declaration() {
            return node.declaration();
        }

        @Override
        public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
            if (settings.whole("level") == 2) {
                checking.countDown();
                try {
                    go.await();
                } catch (InterruptedException stopped) {
                    Thread.currentThread().interrupt();
                }
            }
            return List.of();
        }

        @Override
        public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
            return node.run(inputs, settings, context);
        }
    }

    /** The limit only ends a test that hangs. */
    @Test
    @Timeout(120)
    void aRunIsStoppedWhileAFileIsRead() throws Exception {
        SlowlyChecked slow = new SlowlyChecked(new FakeNode("slow", (inputs, settings, context) -> 1), new CountDownLatch(1), new CountDownLatch(1));
        DeskFolder desks = new DeskFolder(folder);
        try (Workbench workbench = new Workbench(NodeCatalog.of(List.of(new WaitingNode(), slow)), new KeptResults(new ResultFolder(folder.resolve("results"), "test",
                1L << 30)), new OpenedFolders(List.of(folder)))) {
            Path own = desks.fresh("test");
            workbench.open(() -> desks.begin(own, new Workflow("test", own.resolve("workflow.json"),
                    List.of(new Step("wait", "wait-for-stop", Map.of()), new Step("slow", "slow", Map.of())), List.of())));
            workbench.run(List.of("wait"), false);
            CompletableFuture<Workbench.Edited> edited = CompletableFuture.supplyAsync(
                    () -> workbench.edit(List.of(new SettingEdit.Replace("slow", Map.of("level", 2))), ""));
            slow.checking().await();
            assertEquals(Map.of("level", 2), workbench.step("slow").settings(), "the edit counts");
            assertTrue(workbench.going().isPresent(), "the run is told of");
            CompletableFuture<DeskView> stopped = CompletableFuture.supplyAsync(workbench::stop);
            while (workbench.going().isPresent()) {
                TimeUnit.MILLISECONDS.sleep(5);
            }
            assertEquals(List.of(false, false), List.of(edited.isDone(), stopped.isDone()), "whoever asks how steps stand waits for the check");
            slow.go().countDown();
            assertTrue(edited.get().view().desk().orElseThrow().inspection().setUp("slow"));
            assertEquals(Optional.empty(), stopped.get().desk().map(desk -> desk.run().running()).filter(going -> going));
        }
    }

    /** A wait may end of its own accord; whoever waits for a change is told of nothing else. */
    @Test
    @Timeout(120)
    void whoWaitsIsWokenByAChangeOnly() throws Exception {
        DeskFolder desks = new DeskFolder(folder);
        try (Workbench workbench = new Workbench(NodeCatalog.of(List.of(new WaitingNode())), new KeptResults(new ResultFolder(folder.resolve("results"), "test",
                1L << 30)), new OpenedFolders(List.of(folder)))) {
            Path own = desks.fresh("test");
            long known = workbench.open(() -> desks.begin(own, new Workflow("test", own.resolve("workflow.json"), List.of(), List.of()))).revision();
            CompletableFuture<Optional<DeskView>> told = new CompletableFuture<>();
            Thread waiter = new Thread(() -> {
                try {
                    told.complete(workbench.await(known, TimeUnit.MINUTES.toMillis(1)));
                } catch (InterruptedException stopped) {
                    told.completeExceptionally(stopped);
                }
            });
            waiter.start();
            while (waiter.getState() != Thread.State.TIMED_WAITING) {
                TimeUnit.MILLISECONDS.sleep(5);
            }
            synchronized (workbench) {
                workbench.notifyAll();
            }
            TimeUnit.MILLISECONDS.sleep(50);
            workbench.edit(List.of(new LabelEdit.Name("changed")), "");
            assertEquals("changed", told.get().orElseThrow().desk().orElseThrow().workflow().name());
            assertEquals(Optional.empty(), workbench.await(workbench.view().revision(), 20), "and nobody waits for ever");
        }
    }
}
