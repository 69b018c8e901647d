package org.modestead.knime.columns;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** Which columns a rule takes, and what is said of one that cannot be used. */
class ColumnRuleTest {
    private static final NodeDeclaration BUILDER = NodeCatalog.load(List.of(Node.class.getClassLoader())).find("snapshot-builder").orElseThrow()
            .declaration();
    private static final TableSchema TABLE = TableSchema.of(Column.text("run"), Column.number("time"), Column.number("p_1"),
            Column.number("p_2"), Column.number("p.3"), Column.whole("valve"), Column.flag("alarm"));

    @Test
    void everyRuleIsReadBackFromItsText() {
        Stream.of(new ColumnRule.Named(), new ColumnRule.Wildcard("p_*"), new ColumnRule.Regex("^p_\\d+$"),
                new ColumnRule.OfType(Set.of(CellType.LONG, CellType.DOUBLE))).forEach(rule -> assertEquals(rule, ColumnRule.parse("k", rule.text())));
        assertEquals("type number, whole number", new ColumnRule.OfType(Set.of(CellType.LONG, CellType.DOUBLE)).text());
    }

    @Test
    void wildcardsStandForTextAndNothingElseIsSpecial() {
        assertEquals(List.of("p_1", "p_2"), taken("wildcard p_?", Map.of()));
        assertEquals(List.of("p_1", "p_2", "p.3"), taken("wildcard p*", Map.of()));
        assertEquals(List.of("p.3"), taken("wildcard p.3", Map.of()));
    }

    @Test
    void aRegularExpressionMustFitTheWholeName() {
        assertEquals(List.of("p_1", "p_2"), taken("regex p_\\d", Map.of()));
        assertEquals("no column fits the rule regex p_", problem("regex p_").seen());
    }

    @Test
    void typesOutsideTheSettingAreNotTaken() {
        assertEquals(List.of("time", "p_1", "p_2", "p.3", "valve"), taken("type number, whole number, true/false", Map.of()));
    }

    /** Without this every rule by type would take the time column and be refused for it. */
    @Test
    void aColumnThatAnotherSettingNamesIsNotTaken() {
        assertEquals(List.of("p_1", "p_2", "p.3"), taken("type number, whole number", Map.of("time-column", "time", "inputs", List.of("valve"))));
    }

    @Test
    void rulesThatCannotBeReadSayWhatWouldBeRight() {
        assertEquals("the rule \"columns p\"", problem("columns p").seen());
        assertEquals("a rule without a pattern", problem("wildcard ").seen());
        assertEquals("the type numbers", problem("type numbers").seen());
        assertEquals("a rule without a type", problem("type ").seen());
        assertTrue(problem("regex p_(").seen().startsWith("the regular expression \"p_(\""), problem("regex p_(").seen());
        assertThrows(SettingFault.class, () -> ColumnRule.parse("channels", "p_*"));
    }

    @Test
    void namesStoredLastHoldWhileTheTableIsNotKnown() {
        ColumnRules.Resolved resolved = ColumnRules.resolved(BUILDER, Map.of("channels", List.of("p_1"), "channels-by", "wildcard p_*"), Map.of());
        assertEquals(Map.of("channels", List.of("p_1")), resolved.values());
        assertEquals(List.of(), resolved.problems());
    }

    private static SettingProblem problem(String rule) {
        List<SettingProblem> problems = ColumnRules.resolved(BUILDER, Map.of("channels-by", rule), Map.of("table", TABLE)).problems();
        assertEquals(1, problems.size());
        assertEquals("channels", problems.get(0).key());
        return problems.get(0);
    }

    private static Object taken(String rule, Map<String, Object> others) {
        Map<String, Object> raw = new java.util.HashMap<>(others);
        raw.put("channels-by", rule);
        ColumnRules.Resolved resolved = ColumnRules.resolved(BUILDER, raw, Map.of("table", TABLE));
        assertEquals(List.of(), resolved.problems());
        return resolved.values().get("channels");
    }
}
