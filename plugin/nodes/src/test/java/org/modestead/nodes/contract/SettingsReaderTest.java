package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.table.CellType;

class SettingsReaderTest {

    private static final Setting SHARE = new Setting.Number(new Common("share", "Share", "G", "H."), "", 0, true, 1,
            OptionalDouble.of(0.2));
    private static final Setting STEP = new Setting.Number(new Common("step", "Step", "G", "H."), "time", 0, true,
            Double.MAX_VALUE, OptionalDouble.empty());
    private static final Setting DEPTH = new Setting.Whole(new Common("depth", "Depth", "G", "H."), "samples", 1, 100,
            OptionalLong.of(1));
    private static final Setting MODE = new Setting.Choice(new Common("mode", "Mode", "G", "H."),
            List.of(new Option("none", "None", "H."), new Option("file", "File", "H.")), "none");
    private static final Setting PATH = new Setting.File(new Common("path", "Path", "G", "H.").when("mode", "file"), true,
            List.of("csv"), true);
    private static final Setting FAST = new Setting.Flag(new Common("fast", "Fast", "G", "H."), true);
    private static final Setting CHANNELS = new Setting.Columns(new Common("channels", "Channels", "G", "H."), "table",
            Set.of(CellType.DOUBLE), 0, OptionalInt.of(2));
    private static final Setting NAMES = new Setting.Texts(new Common("names", "Names", "G", "H."), List.of("a"));
    private static final Setting TIMES = new Setting.Numbers(new Common("times", "Times", "G", "H."), "time", 0, 10,
            List.of());

    private static SettingsReader.Reading read(Map<String, Object> raw) {
        return SettingsReader.read(declaration(), raw, 2);
    }

    private static NodeDeclaration declaration() {
        return new NodeDeclaration("sample-node", "Sample Node", NodeDeclaration.Stage.DATA, "P.", "D.", List.of(),
                List.of(), List.of(),
                List.of(), List.of(SHARE, STEP, DEPTH, MODE, PATH, FAST, CHANNELS, NAMES, TIMES), 2);
    }

    private static SettingProblem only(Map<String, Object> raw) {
        List<SettingProblem> problems = read(raw).problems();
        assertEquals(1, problems.size(), problems.toString());
        return problems.get(0);
    }

    @Test
    void emptySettingsBecomeTheDefaults() {
        Settings settings = read(Map.of()).settings().orElseThrow();
        assertEquals(0.2, settings.number("share"));
        assertEquals(OptionalDouble.empty(), settings.findNumber("step"));
        assertEquals(1, settings.whole("depth"));
        assertEquals("none", settings.text("mode"));
        assertTrue(settings.flag("fast"));
        assertEquals(List.of("a"), settings.texts("names"));
        assertEquals(List.of(), settings.texts("channels"));
        assertEquals(List.of(), settings.numbers("times"));
    }

    @Test
    void nullCountsAsNotSet() {
        Map<String, Object> raw = new HashMap<>();
        raw.put("share", null);
        assertEquals(0.2, read(raw).settings().orElseThrow().number("share"));
    }

    @Test
    void everythingWrongIsToldAtOnceInTheOrderOfTheDeclarationAfterUnknownKeys() {
        List<SettingProblem> problems = read(Map.of("shrae", 1, "share", 2, "depth", "many", "mode", "nome", "fast",
                1)).problems();
        assertEquals(List.of("shrae", "share", "depth", "mode", "fast"),
                problems.stream().map(SettingProblem::key).toList());
    }

    @Test
    void anUnknownKeyNamesTheNearestKnownOne() {
        SettingProblem problem = only(Map.of("dept", 3));
        assertEquals("no setting of that name in sample-node, perhaps you meant depth", problem.seen());
        assertTrue(problem.wanted().startsWith("use one of share, step, depth"));
    }

    @Test
    void aKeyUnlikeAnyOtherGetsNoGuess() {
        assertFalse(only(Map.of("colour", 3)).seen().contains("perhaps"));
    }

    @Test
    void outOfRangeTellsValueRangeAndUnit() {
        assertEquals(new SettingProblem("depth", "the number 0", "use a whole number at least 1 and at most 100 samples"),
                only(Map.of("depth", 0)));
        assertEquals(new SettingProblem("share", "the number 0", "use a number above 0 and at most 1"),
                only(Map.of("share", 0.0)));
        assertEquals(new SettingProblem("step", "the number -1", "use a number above 0 time units"), only(Map.of("step",
                -1)));
    }

    @Test
    void theLargestAndTheSmallestInclusiveValueAreAllowed() {
        Settings settings = read(Map.of("share", 1, "depth", 100)).settings().orElseThrow();
        assertEquals(1, settings.number("share"));
        assertEquals(100, settings.whole("depth"));
    }

    @Test
    void wholeNumbersMayBeWrittenWithAPointButNotWithAFraction() {
        assertEquals(3, read(Map.of("depth", 3.0)).settings().orElseThrow().whole("depth"));
        assertEquals(3, read(Map.of("depth", new BigDecimal("3.00"))).settings().orElseThrow().whole("depth"));
        assertEquals("the number 3.5", only(Map.of("depth", 3.5)).seen());
    }

    @Test
    void aWholeNumberBeyondSixtyFourBitsIsOutOfRangeNotWrapped() {
        assertEquals("depth", only(Map.of("depth", BigInteger.TWO.pow(64).add(BigInteger.ONE))).key());
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void numbersMustBeFinite(double value) {
        assertEquals("step", only(Map.of("step", value)).key());
        assertEquals("times", only(Map.of("times", List.of(value))).key());
        assertEquals("depth", only(Map.of("depth", value)).key());
    }

    @Test
    void aWrongKindTellsWhatWasSeen() {
        assertEquals("the text \"0.5\"", only(Map.of("share", "0.5")).seen());
        assertEquals("true", only(Map.of("share", true)).seen());
        assertEquals("a list of 2 entries", only(Map.of("share", List.of(1, 2))).seen());
        assertEquals("an object", only(Map.of("share", Map.of("a", 1))).seen());
        assertEquals("the number 1", only(Map.of("fast", 1)).seen());
        assertEquals("the text \"true\"", only(Map.of("fast", "true")).seen());
        assertEquals("the text \"a\"", only(Map.of("names", "a")).seen());
    }

    @Test
    void anUnknownChoiceListsTheOptions() {
        assertEquals(new SettingProblem("mode", "the text \"fil\", perhaps you meant file", "use one of none, file"),
                only(Map.of("mode", "fil")));
    }

    @Test
    void columnsMustBeDifferentAndNotTooMany() {
        assertEquals("the column a more than once", only(Map.of("channels", List.of("a", "a"))).seen());
        assertEquals(new SettingProblem("channels", "3 columns", "choose at most 2"), only(Map.of("channels", List.of("a",
                "b", "c"))));
        assertEquals("entry 2 is the number 1", only(Map.of("channels", List.of("a", 1))).seen());
        assertEquals("entry 1 is an empty text", only(Map.of("channels", List.of(" "))).seen());
    }

    @Test
    void aRequiredValueIsAskedForOnlyWhileItsSettingIsShown() {
        assertTrue(read(Map.of()).settings().isPresent());
        SettingProblem problem = only(Map.of("mode", "file"));
        assertEquals("path", problem.key());
        assertEquals("no value", problem.seen());
        assertEquals("an empty text", only(Map.of("mode", "file", "path", " ")).seen());
    }

    @Test
    void aRequiredTextWithADefaultNeedNotBeGivenButMayNotBeBlank() {
        NodeDeclaration titled = new NodeDeclaration("titled", "Titled", NodeDeclaration.Stage.REPORT, "P.", "D.",
                List.of(), List.of(),
                List.of(), List.of(), List.of(new Setting.Text(new Common("title", "Title", "G", "H."), "Report", false,
                        true)), 1);
        assertEquals("Report", SettingsReader.read(titled, Map.of(), 1).settings().orElseThrow().text("title"));
        assertEquals("an empty text", SettingsReader.read(titled, Map.of("title", ""), 1).problems().get(0).seen());
    }

    @Test
    void hiddenSettingsAreCheckedAndKept() {
        assertEquals("x.csv", read(Map.of("path", "x.csv")).settings().orElseThrow().text("path"));
        assertEquals("the number 1", only(Map.of("path", 1)).seen());
    }

    @Test
    void entriesOfNumberListsTellTheirPlace() {
        SettingProblem problem = only(Map.of("times", Arrays.asList(1, 11)));
        assertEquals("entry 2 is the number 11", problem.seen());
        assertEquals("use a list of numbers, each at least 0 and at most 10 time units", problem.wanted());
    }

    @Test
    void settingsOfANewerVersionAreRefusedWithBothVersions() {
        List<SettingProblem> problems = SettingsReader.read(declaration(), Map.of(), 3).problems();
        assertEquals("version", problems.get(0).key());
        assertTrue(problems.get(0).wanted().contains("up to version 2"));
    }

    @Test
    void settingsOfAnOlderVersionGoThroughTheNodesUpgrade() {
        Node node = new Node() {
            @Override
            public NodeDeclaration declaration() {
                return SettingsReaderTest.declaration();
            }

            @Override
            public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
                throw new UnsupportedOperationException();
            }

            @Override
            public Map<String, Object> upgrade(Map<String, Object> stored, int version) {
                assertEquals(1, version);
                return Map.of("depth", stored.get("stack"));
            }
        };
        assertEquals(7, SettingsReader.read(node, Map.of("version", 1, "stack",
                7)).settings().orElseThrow().whole("depth"));
        assertEquals("stack", SettingsReader.read(node, Map.of("version", 2, "stack", 7)).problems().get(0).key());
        assertEquals("version", SettingsReader.read(node, Map.of("version", "one")).problems().get(0).key());
        assertEquals("version", SettingsReader.read(node, Map.of("version", 9)).problems().get(0).key());
    }

    @Test
    void typedTextsBecomeTheKindOfTheSetting() {
        assertEquals(Optional.of(new BigDecimal("0.5")), SettingsReader.fromText(SHARE, " 0.5 "));
        assertEquals(Optional.of(true), SettingsReader.fromText(FAST, "true"));
        assertEquals(Optional.of(List.of("a", "b")), SettingsReader.fromText(NAMES, "a, b"));
        assertEquals(Optional.of(List.of("a, b", "c")), SettingsReader.fromText(NAMES, "a, b\nc\n"));
        assertEquals(Optional.of(List.of(new BigDecimal("1"), new BigDecimal("2.5"))), SettingsReader.fromText(TIMES,
                "1,2.5"));
        assertEquals(Optional.empty(), SettingsReader.fromText(STEP, ""));
        assertEquals(Optional.of(List.of()), SettingsReader.fromText(NAMES, ""));
        assertEquals(Optional.of("none"), SettingsReader.fromText(MODE, "none"));
    }

    @Test
    void aTypedTextOfTheWrongKindIsLeftForReadingToRefuse() {
        Object value = SettingsReader.fromText(SHARE, "half").orElseThrow();
        assertEquals("the text \"half\"", only(Map.of("share", value)).seen());
        Object nan = SettingsReader.fromText(SHARE, "NaN").orElseThrow();
        assertEquals("the text \"NaN\"", only(Map.of("share", nan)).seen());
    }
}
