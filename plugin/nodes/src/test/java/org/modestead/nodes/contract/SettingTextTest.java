package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.table.CellType;

class SettingTextTest {

    private static final Common COMMON = new Common("key", "Label", "G", "H.");

    private static Setting.Choice choice(Common common) {
        return new Setting.Choice(common, List.of(new Option("a", "A", "H."), new Option("b", "B", "H.")), "a");
    }

    @Test
    void rangesSayWhatIsAllowedInWords() {
        assertEquals("at least 1 Hz", SettingText.range(new Setting.Number(COMMON, "Hz", 1, false, Double.MAX_VALUE,
                OptionalDouble.empty())));
        assertEquals("at most 5", SettingText.range(new Setting.Number(COMMON, "", -Double.MAX_VALUE, false, 5,
                OptionalDouble.empty())));
        assertEquals("", SettingText.range(new Setting.Number(COMMON, "s", -Double.MAX_VALUE, false, Double.MAX_VALUE,
                OptionalDouble.empty())));
        assertEquals("at least 0", SettingText.range(new Setting.Whole(COMMON, "", 0, Long.MAX_VALUE,
                OptionalLong.empty())));
        assertEquals("one of a, b", SettingText.range(choice(COMMON)));
        assertEquals("a column of type number, whole number or date", SettingText.range(new Setting.OneColumn(COMMON, "t",
                Set.of(CellType.DATE, CellType.LONG, CellType.DOUBLE), true)));
        assertEquals("1 to 3 columns of type text", SettingText.range(new Setting.Columns(COMMON, "t",
                Set.of(CellType.TEXT), 1,
                OptionalInt.of(3))));
        assertEquals("a name ending in .csv, .json", SettingText.range(new Setting.File(COMMON, true, List.of("csv",
                "json"), true)));
    }

    @Test
    void defaultsAreWrittenAsAPersonWouldTypeThem() {
        assertEquals("0.2", SettingText.initial(new Setting.Number(COMMON, "", 0, false, 1, OptionalDouble.of(0.2))));
        assertEquals("", SettingText.initial(new Setting.Number(COMMON, "", 0, false, 1, OptionalDouble.empty())));
        assertEquals("a", SettingText.initial(choice(COMMON)));
        assertEquals("0.5, 2", SettingText.initial(new Setting.Numbers(COMMON, "", 0, 9, List.of(0.5, 2.0))));
        assertEquals("true", SettingText.initial(new Setting.Flag(COMMON, true)));
    }

    @ParameterizedTest
    @CsvSource({"0.1, 0.1", "3.0, 3", "1500000, 1500000", "-0.25, -0.25", "0, 0", "1e-300, 1e-300", "1e300, 1e300", "2.5e-9, 2.5e-9"})
    void numbersArePlainWhereThatIsShort(double value, String text) {
        assertEquals(text, SettingText.plain(value));
    }

    @Test
    void aSettingIsHiddenWithTheOneItDependsOn() {
        Setting outer = choice(new Common("outer", "O", "G", "H."));
        Setting inner = choice(new Common("inner", "I", "G", "H.").when("outer", "b"));
        Setting leaf = new Setting.Flag(new Common("leaf", "L", "G", "H.").when("inner", "a"), false);
        NodeDeclaration declaration = new NodeDeclaration("n", "N", NodeDeclaration.Stage.DATA, "P.", "D.", List.of(),
                List.of(), List.of(),
                List.of(), List.of(outer, inner, leaf), 1);
        assertFalse(Visibility.isShown(declaration, Map.of(), leaf), "outer is a by default");
        assertTrue(Visibility.isShown(declaration, Map.of("outer", "b"), leaf));
        assertFalse(Visibility.isShown(declaration, Map.of("outer", "b", "inner", "b"), leaf));
        assertFalse(Visibility.isShown(declaration, Map.of("inner", "a"), leaf));
    }

    @Test
    void namesNearEnoughAreSuggestedAndOthersAreNot() {
        List<String> known = List.of("delay-depth", "delay-spacing", "detrend");
        assertEquals(Optional.of("delay-depth"), NearestName.of("delaydepth", known));
        assertEquals(Optional.of("detrend"), NearestName.of("Detrended", known));
        assertEquals(Optional.of("delay-depth"), NearestName.of("delay", known), "the beginning of several: the first"
                + " of the nearest");
        assertEquals(Optional.empty(), NearestName.of("colour", known));
        assertEquals("", NearestName.hint("colour", known));
    }
}
