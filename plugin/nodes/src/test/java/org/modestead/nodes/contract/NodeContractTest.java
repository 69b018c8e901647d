package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/** What every node found through the service file must declare, one test a node and claim. */
class NodeContractTest {

    private static final Pattern KEY = Pattern.compile("[a-z][a-z0-9]*(-[a-z0-9]+)*");
    private static final Pattern TITLE_WORD = Pattern.compile("[A-Z][a-z]+(-[a-z]+)*");
    private static final List<String> PRAISE = List.of("powerful", "easy", "easily", "simply", "state of the art",
            "cutting-edge",
            "novel", "revolutionary", "best-in-class");
    private static final int SHORTEST_DESCRIPTION = 200;

    private interface Claim {
        void check(NodeDeclaration declaration, Node node);
    }

    private static Stream<DynamicTest> everyNode(Claim claim) {
        List<Node> nodes = NodeCatalog.load(List.of(Node.class.getClassLoader())).nodes();
        assertTrue(nodes.size() >= 7, "the service file names the nodes");
        return nodes.stream().map(node -> DynamicTest.dynamicTest(node.declaration().id(),
                () -> claim.check(node.declaration(), node)));
    }

    @TestFactory
    Stream<DynamicTest> idsAndKeysAreLowerCaseWithDashesAndUnique() {
        return everyNode((declaration, node) -> {
            assertTrue(KEY.matcher(declaration.id()).matches(), declaration.id());
            assertUnique(declaration.settings().stream().map(Setting::key).toList());
            assertUnique(declaration.inputs().stream().map(Port::id).toList());
            assertUnique(declaration.outputs().stream().map(Port::id).toList());
            declaration.settings().forEach(setting -> assertFalse(setting.key().equals(SettingsReader.VERSION)));
        });
    }

    @TestFactory
    Stream<DynamicTest> titlesAreOneToThreeWordsInTitleCase() {
        return everyNode((declaration, node) -> {
            List<String> words = Stream.of(declaration.title().split(" ")).filter(word -> !word.equals("and")).toList();
            assertTrue(words.size() <= 3, declaration.title());
            words.forEach(word -> assertTrue(TITLE_WORD.matcher(word).matches(), word));
        });
    }

    @TestFactory
    Stream<DynamicTest> everyTextForPeopleIsThereAndEndsWithAFullStop() {
        return everyNode((declaration, node) -> {
            assertSentence(declaration.purpose());
            assertSentence(declaration.description());
            assertFalse(declaration.description().contains("\\"), "a line continuation shows");
            assertTrue(declaration.description().length() > SHORTEST_DESCRIPTION, "the description is too short to help");
            assertFalse(declaration.keywords().isEmpty());
            Stream.concat(declaration.inputs().stream(), declaration.outputs().stream()).forEach(port -> {
                assertSentence(port.description());
                assertLabel(port.title());
            });
            declaration.settings().forEach(setting -> {
                assertSentence(setting.common().help());
                assertLabel(setting.common().label());
                assertLabel(setting.common().group());
            });
        });
    }

    @TestFactory
    Stream<DynamicTest> textsPraiseNothing() {
        return everyNode((declaration, node) -> {
            String all = (declaration.purpose() + declaration.description()
                    + declaration.settings()).toLowerCase(Locale.ROOT);
            PRAISE.forEach(word -> assertFalse(Pattern.compile("\\b" + word + "\\b").matcher(all).find(), word));
        });
    }

    @TestFactory
    Stream<DynamicTest> defaultsPassTheirOwnChecks() {
        return everyNode((declaration, node) -> declaration.settings().forEach(setting ->
                SettingValue.initial(setting).filter(value -> !SettingText.isRequired(setting)).ifPresent(value ->
                        assertEquals(List.of(), SettingValue.check(setting, value).problems(), setting.key()))));
    }

    /** "Highest order: 0 functions" reads as if there were none, where 0 leaves the choice to the node. */
    @TestFactory
    Stream<DynamicTest> aCountThatMayBeZeroIsOfWhatItsLabelOrHelpTellsOf() {
        return everyNode((declaration, node) -> declaration.settings().stream().filter(Setting.Whole.class::isInstance).map(Setting.Whole.class::cast)
                .filter(whole -> whole.min() == 0 && whole.unit().matches("[a-z]{3,}")).forEach(whole -> {
                    String told = (whole.common().label() + " " + whole.common().help()).toLowerCase(Locale.ROOT);
                    assertTrue(told.contains(whole.unit().replaceFirst("s$", "")), whole.key() + " counts " + whole.unit());
                }));
    }

    @TestFactory
    Stream<DynamicTest> choicesOfferTheirDefaultAndExplainEachOption() {
        return everyNode((declaration, node) -> declaration.settings().stream().filter(Setting.Choice.class::isInstance)
                .map(Setting.Choice.class::cast).forEach(choice -> {
                    List<String> ids = choice.options().stream().map(Setting.Option::id).toList();
                    assertTrue(ids.contains(choice.initial()), choice.key());
                    assertUnique(ids);
                    choice.options().forEach(option -> {
                        assertLabel(option.label());
                        assertSentence(option.help());
                    });
                }));
    }

    @TestFactory
    Stream<DynamicTest> conditionsNameAnEarlierChoiceOrFlagAndValuesItCanHave() {
        return everyNode((declaration, node) -> declaration.settings().forEach(setting ->
                setting.common().visibleWhen().ifPresent(condition -> {
                    int self = declaration.settings().indexOf(setting);
                    Setting other = declaration.settings().stream().limit(self).filter(s -> s.key().equals(condition.key()))
                            .findFirst().orElseThrow(() -> new AssertionError(setting.key() + " depends on "
                                    + condition.key()));
                    Set<String> possible = other instanceof Setting.Choice choice
                            ? new HashSet<>(choice.options().stream().map(Setting.Option::id).toList()) : Set.of("true",
                                    "false");
                    assertTrue(other instanceof Setting.Choice || other instanceof Setting.Flag, other.key());
                    assertTrue(possible.containsAll(condition.values()), setting.key() + " when " + condition);
                })));
    }

    @TestFactory
    Stream<DynamicTest> columnSettingsNameAnInputTable() {
        return everyNode((declaration, node) -> {
            List<String> tables = declaration.inputs().stream()
                    .filter(port -> port.type() == PortType.TABLE).map(Port::id).toList();
            declaration.settings().forEach(setting -> {
                String port = setting instanceof Setting.OneColumn one ? one.port()
                        : setting instanceof Setting.Columns several ? several.port() : "";
                assertTrue(port.isEmpty() || tables.contains(port), setting.key());
            });
        });
    }

    @TestFactory
    Stream<DynamicTest> aFreshNodeIsReadyOrSaysWhatIsMissingInFullSentences() {
        return everyNode((declaration, node) -> {
            SettingsReader.Reading reading = SettingsReader.read(node, Map.of());
            List<SettingProblem> problems = reading.settings().map(settings -> node.check(Map.of(), settings))
                    .orElseGet(reading::problems);
            problems.forEach(problem -> {
                assertLabel(problem.seen());
                assertLabel(problem.wanted());
            });
            assertTrue(problems.size() <= 1, problems.toString());
        });
    }

    @TestFactory
    Stream<DynamicTest> theDeclarationIsTheSameAtEveryCall() {
        return everyNode((declaration, node) -> {
            assertEquals(declaration, node.declaration());
            assertTrue(declaration.settingsVersion() >= 1);
        });
    }

    private static void assertSentence(String text) {
        assertNotNull(text);
        assertTrue(text.endsWith("."), "ends with a full stop: " + text);
        assertFalse(text.matches("(?s).*[^.]\\.\\.[^.].*|.*[^.]\\.\\."), "one full stop: " + text);
        assertFalse(text.contains("  "), "single spaces: " + text);
        assertTrue(Character.isUpperCase(text.charAt(0)) || !Character.isLetter(text.charAt(0))
                || text.matches("[a-z]+\\(.*|x.*"), "begins with a capital or a formula: " + text);
    }

    private static void assertLabel(String text) {
        assertFalse(text.isBlank());
        assertFalse(text.endsWith("."), text);
        assertEquals(text.strip(), text);
    }

    private static void assertUnique(List<String> names) {
        assertEquals(names.size(), new HashSet<>(names).size(), names.toString());
        names.forEach(name -> assertTrue(KEY.matcher(name).matches(), name));
    }
}
