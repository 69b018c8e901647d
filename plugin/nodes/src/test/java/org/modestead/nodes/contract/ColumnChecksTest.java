package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.Set;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

class ColumnChecksTest {

    private static final TableSchema PUMPS = TableSchema.of(Column.text("run"), Column.number("flow"),
            Column.number("level"));

    private static List<SettingProblem> check(Map<String, Object> raw, Map<String, TableSchema> inputs) {
        NodeDeclaration declaration = new NodeDeclaration("n", "N", NodeDeclaration.Stage.DATA, "P.", "D.", List.of(),
                List.of(),
                List.of(Port.of("table", PortType.TABLE, "T", "D.")), List.of(),
                List.of(new Setting.Flag(new Common("named", "Named", "G", "H."), true),
                        new Setting.OneColumn(new Common("run", "Run", "G", "H.").when("named", "true"), "table",
                                Set.of(CellType.TEXT), false),
                        new Setting.Columns(new Common("channels", "C", "G", "H."), "table", Set.of(CellType.DOUBLE,
                                CellType.LONG), 0,
                                OptionalInt.empty())), 1);
        return ColumnChecks.check(declaration, SettingsReader.read(declaration, raw, 1).settings().orElseThrow(), inputs);
    }

    @Test
    void columnsThatAreThereAndFitPass() {
        assertEquals(List.of(), check(Map.of("run", "run", "channels", List.of("flow", "level")), Map.of("table",
                PUMPS)));
    }

    @Test
    void aColumnThatIsNotThereIsNamedWithTheNearestAndThoseThatWouldFit() {
        assertEquals(List.of(new SettingProblem("channels", "the input has no column flaw, perhaps you meant flow",
                "choose a column of type number or whole number: flow, level")),
                check(Map.of("channels", List.of("flaw")), Map.of("table", PUMPS)));
    }

    @Test
    void aColumnOfAnotherTypeIsNamedWithItsType() {
        assertEquals(List.of(new SettingProblem("run", "the column flow holds number", "choose a column of type text:"
                + " run")),
                check(Map.of("run", "flow"), Map.of("table", PUMPS)));
    }

    @Test
    void settingsThatAreNotShownAndPortsNotYetKnownAreLeftAlone() {
        assertEquals(List.of(), check(Map.of("named", false, "run", "absent"), Map.of("table", PUMPS)));
        assertEquals(List.of(), check(Map.of("channels", List.of("absent")), Map.of()));
    }

    @Test
    void longListsOfFittingColumnsAreCutWithTheirNumber() {
        TableSchema wide = new TableSchema(IntStream.range(0, 20).mapToObj(i -> Column.number("c" + i)).toList());
        assertEquals("choose a column of type number or whole number: c0, c1, c2, c3, c4, c5, c6, c7, c8, c9, c10, c11"
                + " and 8 more",
                check(Map.of("channels", List.of("absent")), Map.of("table", wide)).get(0).wanted());
    }
}
