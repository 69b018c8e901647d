package org.modestead.nodes.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Steps;

/** A tank that empties to 0.8 of its level in every step and is filled through a valve: level' = 0.8 level + 0.5 valve. */
class InputSeparationNodeTest {

    private static MemoryTable tank() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.number("time"), Column.number("level [m]"),
                Column.number("valve [%]")), "tank");
        double level = 1;
        for (int k = 0; k < 80; k++) {
            double valve = 40 + 30 * Math.sin(0.9 * k);
            rows.row((double) k, level, valve);
            level = 0.8 * level + 0.5 * valve;
        }
        return rows.build();
    }

    private static Object snapshots() {
        return Steps.run("snapshot-builder", Map.of("table", tank()), Map.of("time-column", "time", "inputs", List.of("valve [%]"),
                "channels", List.of("level [m]"))).outputs().get("snapshots");
    }

    private static NodeResult fit(Map<String, Object> raw) {
        return Steps.run("operator-fitter", Map.of("snapshots", snapshots()), raw);
    }

    private static String inputsRow(NodeResult fitted) {
        List<List<String>> rows = Steps.texts(fitted, "fit");
        return rows.stream().filter(row -> row.get(0).equals("inputs")).findFirst().orElseThrow().get(1);
    }

    @Test
    void theValveIsSeparatedUnlessItIsLeftIn() {
        NodeResult fitted = fit(Map.of());
        NodeResult modes = Steps.run("spectrum-extractor", Map.of("operator", fitted.outputs().get("operator")), Map.of());
        assertEquals(Math.log(0.8), Steps.number(modes, "modes", "lambda_real", 0), 1e-10);
        assertEquals("1, separated, held from sample to sample, 2 independent terms", inputsRow(fitted));
        assertEquals(List.of(), fitted.doubts().stream().filter(doubt -> doubt.code().equals("inputs-not-separated")).toList());
        NodeResult left = fit(Map.of("inputs", "leave-in"));
        assertEquals("1, not separated", inputsRow(left));
        assertTrue(left.doubts().stream().anyMatch(doubt -> doubt.code().equals("inputs-not-separated")));
        assertEquals("1, separated, straight from sample to sample, 3 independent terms", inputsRow(fit(Map.of("inputs", "straight"))));
    }

    @Test
    void settingsStoredBeforeInputsWereKnownLeaveThemIn() {
        assertEquals("1, not separated", inputsRow(fit(Map.of("version", 1))));
    }

    @Test
    void anOperatorThatCannotSeparateInputsRefusesAndSaysWhatToDo() {
        Object kernel = Steps.run("kernel-chooser", Map.of("snapshots", snapshots()), Map.of("family", "polynomial")).outputs().get("kernel");
        Map<String, Object> inputs = Map.of("snapshots", snapshots(), "kernel", kernel);
        SettingFault fault = assertThrows(SettingFault.class, () -> Steps.run("operator-fitter", inputs, Map.of("estimator", "kernel-step")));
        assertEquals("fit the linear or the dictionary step map, or leave the inputs in", fault.wanted());
        FittedOperator left = (FittedOperator) Steps.run("operator-fitter", inputs, Map.of("estimator", "kernel-step", "inputs", "leave-in"))
                .outputs().get("operator");
        assertTrue(left.doubts().stream().anyMatch(doubt -> doubt.code().equals("inputs-not-separated")));
    }

    @Test
    void kernelsComparedUnderInputsAreDoubted() {
        NodeResult ranked = Steps.run("kernel-chooser", Map.of("snapshots", snapshots()), Map.of("choose", "rank", "candidates",
                List.of("linear")));
        assertTrue(ranked.doubts().stream().anyMatch(doubt -> doubt.code().equals("inputs-not-separated")), ranked.doubts().toString());
    }
}
