package org.modestead.host.bench.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.modestead.host.TestWorkflows;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Port;

/** Every connection that is refused is refused with a sentence that tells why, and all others can be drawn. */
class LinkRulesTest {

    private static final NodeCatalog NODES = TestWorkflows.allNodes();

    @Test
    void everyPairOfPortsOfAllNodesLinksExactlyWhenTheirTypesAgree() {
        List<Step> steps = NODES.ids().stream().flatMap(id -> List.of(new Step("from-" + id, id, Map.of()), new Step("to-" + id, id, Map.of())).stream()).toList();
        Workflow workflow = workflow(steps, List.of());
        int refused = 0;
        int drawn = 0;
        for (String from : NODES.ids()) {
            for (String to : NODES.ids()) {
                for (Port output : NODES.find(from).orElseThrow().declaration().outputs()) {
                    for (Port input : NODES.find(to).orElseThrow().declaration().inputs()) {
                        Link link = new Link(new Link.End("from-" + from, output.id()), new Link.End("to-" + to, input.id()));
                        var refusal = LinkRules.refusal(workflow, NODES, link);
                        assertEquals(output.type() != input.type(), refusal.isPresent(), link.toString());
                        if (refusal.isPresent()) {
                            refused++;
                            String sentence = refusal.get().getMessage();
                            assertTrue(sentence.contains(output.type().title()) && sentence.contains(input.type().title()) && sentence.contains(link.from().toString())
                                    && sentence.contains(link.to().toString()), sentence);
                            assertThrows(EditFault.class, () -> new LinkEdit.Connect(link, true).apply(workflow, NODES));
                        } else {
                            drawn++;
                            assertTrue(new LinkEdit.Connect(link, false).apply(workflow, NODES).workflow().links().contains(link));
                        }
                    }
                }
            }
        }
        assertTrue(refused > 500 && drawn > 100, refused + " refused, " + drawn + " drawn");
    }

    @Test
    void aWrongTypeIsToldWithBothTypes() {
        assertEquals("link source.table to fit.snapshots: source.table gives a Table, and fit.snapshots takes Snapshots; link an output that gives Snapshots.",
                refusal("source.table", "fit.snapshots"));
        assertEquals("link fit.operator to snapshots.table: fit.operator gives an Operator, and snapshots.table takes a Table; link an output that gives a Table.",
                refusal("fit.operator", "snapshots.table"));
    }

    @Test
    void aStepCannotFeedItselfAndNoCircleIsDrawn() {
        Workflow queries = workflow(List.of(new Step("a", "table-query", Map.of()), new Step("b", "table-query", Map.of()), new Step("c", "table-query", Map.of())),
                List.of(link("a.table", "b.input"), link("b.table", "c.input")));
        assertEquals("link a.table to a.input: both ends are the same step; link two different steps.", sentence(queries, "a.table", "a.input"));
        assertEquals("link c.table to a.input: c already takes input from a, directly or through others; link so that no step feeds itself in a circle.",
                sentence(queries, "c.table", "a.input"));
        assertTrue(LinkRules.refusal(queries, NODES, link("a.table", "c.input2")).isEmpty());
    }

    @Test
    void anInputThatIsFedKeepsItsLinkUnlessReplaced() {
        Workflow fed = workflow(List.of(new Step("a", "table-query", Map.of()), new Step("b", "table-query", Map.of()), new Step("c", "table-query", Map.of())),
                List.of(link("a.table", "c.input")));
        EditFault refused = assertThrows(EditFault.class, () -> new LinkEdit.Connect(link("b.table", "c.input"), false).apply(fed, NODES));
        assertEquals("link b.table to c.input: c.input is already fed by a.table; remove that link first, or replace it.", refused.getMessage());
        assertEquals(List.of(link("b.table", "c.input")), new LinkEdit.Connect(link("b.table", "c.input"), true).apply(fed, NODES).workflow().links());
    }

    @Test
    void endsThatAreNotThereAreNamed() {
        assertEquals("step nowhere: there is no such step; use one of source, snapshots, fit.", fault("nowhere.table", "fit.snapshots"));
        assertEquals("step source: it has no output \"rows\"; use one of table.", fault("source.rows", "snapshots.table"));
        assertEquals("step source: it has no input \"table\"; choose another step: this one has no input.", fault("source.table", "source.table"));
    }

    private static String refusal(String from, String to) {
        return sentence(chain(), from, to);
    }

    private static String sentence(Workflow workflow, String from, String to) {
        return LinkRules.refusal(workflow, NODES, link(from, to)).orElseThrow().getMessage();
    }

    private static String fault(String from, String to) {
        return assertThrows(EditFault.class, () -> LinkRules.refusal(chain(), NODES, link(from, to))).getMessage();
    }

    private static Workflow chain() {
        return workflow(List.of(new Step("source", "table-source", Map.of()), new Step("snapshots", "snapshot-builder", Map.of()),
                new Step("fit", "operator-fitter", Map.of())), List.of());
    }

    private static Workflow workflow(List<Step> steps, List<Link> links) {
        return new Workflow("test", Path.of("/desk/workflow.json"), steps, links);
    }

    private static Link link(String from, String to) {
        return new Link(Ends.read(from), Ends.read(to));
    }
}
