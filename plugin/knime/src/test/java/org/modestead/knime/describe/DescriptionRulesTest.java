package org.modestead.knime.describe;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.net.URI;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.knime.core.node.NodeFactory.NodeType;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.w3c.dom.Element;

/** Descriptions keep the rules of the platform's schema Node_v5.3, written down here a second time. */
class DescriptionRulesTest {

    private static final Set<String> BLOCKS = Set.of("p", "ul", "ol", "dl", "table", "pre", "h3", "h4", "hr", "br", "a", "b", "i", "em", "u",
            "tt", "code", "s", "samp", "sup", "sub");
    private static final Set<String> INLINE = Set.of("br", "a", "b", "i", "em", "u", "tt", "code", "s", "samp", "sup", "sub");
    /** What may stand in what; elements that hold text only are not named. */
    private static final Map<String, Set<String>> CONTENT = Map.of(
            "intro", BLOCKS, "option", BLOCKS, "inPort", BLOCKS, "outPort", BLOCKS, "view", BLOCKS,
            "p", INLINE, "b", INLINE, "tt", INLINE, "ul", Set.of("li"), "li", BLOCKS);

    static List<NodeDeclaration> declarations() {
        return NodeCatalog.load(List.of(Node.class.getClassLoader())).nodes().stream().map(Node::declaration).toList();
    }

    private static List<Element> children(Element parent) {
        List<Element> children = new ArrayList<>();
        for (org.w3c.dom.Node child = parent.getFirstChild(); child != null; child = child.getNextSibling()) {
            if (child instanceof Element element) {
                children.add(element);
            }
        }
        return children;
    }

    private static List<String> names(List<Element> elements) {
        return elements.stream().map(Element::getLocalName).toList();
    }

    private static Element child(Element parent, String name) {
        return children(parent).stream().filter(element -> element.getLocalName().equals(name)).findFirst().orElseThrow();
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void theRootHasItsPartsInOrder(NodeDeclaration declaration) {
        Element root = new DeclaredDescription(declaration).getXMLDescription();
        assertEquals("http://knime.org/node/v5.3", root.getNamespaceURI());
        assertEquals("knimeNode", root.getLocalName());
        assertEquals(List.of("name", "shortDescription", "fullDescription", "ports", "views", "keywords"), names(children(root)));
        assertTrue(Set.of("Source", "Sink", "Learner", "Predictor", "Manipulator", "Visualizer", "Other").contains(root.getAttribute("type")));
        assertFalse(child(root, "name").getTextContent().isBlank());
        assertFalse(child(root, "shortDescription").getTextContent().contains("\n"));
        assertTrue(children(child(root, "name")).isEmpty() && children(child(root, "shortDescription")).isEmpty());
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void theFullDescriptionIsAnIntroThenTabsThatAllHoldOptions(NodeDeclaration declaration) {
        Element full = child(new DeclaredDescription(declaration).getXMLDescription(), "fullDescription");
        assertEquals("intro", children(full).get(0).getLocalName());
        for (Element tab : children(full).subList(1, children(full).size())) {
            assertEquals("tab", tab.getLocalName());
            assertFalse(tab.getAttribute("name").isBlank());
            assertFalse(children(tab).isEmpty());
            children(tab).forEach(option -> {
                assertEquals("option", option.getLocalName());
                assertFalse(option.getAttribute("name").isBlank());
                assertFalse(option.getTextContent().isBlank(), option.getAttribute("name"));
            });
        }
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void portsComeInThenOutWithUniqueNumbersNamesAndTexts(NodeDeclaration declaration) {
        List<Element> ports = children(child(new DeclaredDescription(declaration).getXMLDescription(), "ports"));
        List<String> expected = new ArrayList<>();
        for (int i = 0; i < declaration.inputs().size(); i++) {
            expected.add("inPort " + i);
        }
        for (int i = 0; i < declaration.outputs().size(); i++) {
            expected.add("outPort " + i);
        }
        assertEquals(expected, ports.stream().map(port -> port.getLocalName() + " " + port.getAttribute("index")).toList());
        ports.forEach(port -> assertFalse(port.getAttribute("name").isBlank() || port.getTextContent().isBlank()));
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void onlyAllowedTagsStandInEachOther(NodeDeclaration declaration) {
        Element root = new DeclaredDescription(declaration).getXMLDescription();
        check(child(child(root, "fullDescription"), "intro"));
        children(child(root, "fullDescription")).stream().filter(tab -> tab.getLocalName().equals("tab"))
                .forEach(tab -> children(tab).forEach(DescriptionRulesTest::check));
        children(child(root, "ports")).forEach(DescriptionRulesTest::check);
        children(child(root, "views")).forEach(DescriptionRulesTest::check);
    }

    private static void check(Element element) {
        for (Element child : children(element)) {
            Set<String> allowed = CONTENT.getOrDefault(element.getLocalName(), Set.of());
            assertTrue(allowed.contains(child.getLocalName()), child.getLocalName() + " in " + element.getLocalName());
            check(child);
        }
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void keywordsAreNotEmptyAndTheGettersSayWhatTheXmlSays(NodeDeclaration declaration) {
        DeclaredDescription description = new DeclaredDescription(declaration);
        Element root = description.getXMLDescription();
        List<String> keywords = children(child(root, "keywords")).stream().map(Element::getTextContent).toList();
        assertEquals(List.of(description.getKeywords()), keywords);
        assertTrue(keywords.stream().noneMatch(String::isBlank));
        assertEquals(root.getAttribute("type"), description.getType().name());
        assertEquals(root.getAttribute("icon"), description.getIconPath());
        assertEquals(child(root, "name").getTextContent(), description.getNodeName());
        Set<String> options = new HashSet<>();
        description.getDialogOptionGroups().forEach(group -> group.getOptions().forEach(option -> options.add(option.getName())));
        children(child(root, "fullDescription")).stream().skip(1).forEach(tab -> children(tab)
                .forEach(option -> assertTrue(options.contains(option.getAttribute("name")), option.getAttribute("name"))));
    }

    @ParameterizedTest
    @MethodSource("declarations")
    void theIconLiesInTheBundle(NodeDeclaration declaration) {
        // Resolved against the package of the factory, as the platform does.
        String path = URI.create("/org/modestead/knime/" + new DeclaredDescription(declaration).getIconPath()).normalize().getPath();
        assertTrue(DeclaredDescription.class.getResource(path) != null, path);
    }

    @Test
    void typesSayWhatNodesAreFor() {
        Map<String, NodeType> expected = Map.ofEntries(Map.entry("signal-generator", NodeType.Source), Map.entry("model-reader", NodeType.Source),
                Map.entry("model-writer", NodeType.Sink), Map.entry("snapshot-builder", NodeType.Manipulator),
                Map.entry("model-applier", NodeType.Manipulator), Map.entry("kernel-chooser", NodeType.Learner),
                Map.entry("operator-fitter", NodeType.Learner), Map.entry("spectrum-extractor", NodeType.Other),
                Map.entry("wellposedness-checker", NodeType.Other), Map.entry("forecast", NodeType.Predictor),
                Map.entry("backtest", NodeType.Other), Map.entry("mode-watch", NodeType.Other), Map.entry("mode-report", NodeType.Visualizer));
        declarations().stream().filter(declaration -> expected.containsKey(declaration.id())).forEach(declaration ->
                assertEquals(expected.get(declaration.id()), new DeclaredDescription(declaration).getType(), declaration.id()));
    }
}
