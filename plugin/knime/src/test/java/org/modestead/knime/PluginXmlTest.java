package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.InputStream;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.stream.Collectors;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.knime.core.node.NodeSetFactory;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.modestead.knime.port.StagePorts;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.PortType;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** What plugin.xml registers exists, and nothing that must be registered is missing. */
class PluginXmlTest {

    private static Document plugin;

    @BeforeAll
    static void read() throws Exception {
        try (InputStream in = PluginXmlTest.class.getResourceAsStream("/plugin.xml")) {
            plugin = DocumentBuilderFactory.newDefaultInstance().newDocumentBuilder().parse(in);
        }
    }

    private static List<Element> elements(String tag) {
        NodeList found = plugin.getElementsByTagName(tag);
        List<Element> all = new ArrayList<>();
        for (int i = 0; i < found.getLength(); i++) {
            all.add((Element) found.item(i));
        }
        return all;
    }

    @Test
    void oneNodeSetIsRegistered() throws Exception {
        assertEquals(1, elements("nodeset").size());
        assertInstanceOf(NodeSetFactory.class, made(elements("nodeset").get(0).getAttribute("factory-class")));
    }

    /** Our own category under the one root that is open to all, a sub-category a stage, in working order, all open to others. */
    @Test
    void everyStageHasACategoryInWorkingOrder() {
        List<Element> categories = elements("category");
        assertEquals("/community", categories.get(0).getAttribute("path"));
        List<String> stages = Arrays.stream(NodeDeclaration.Stage.values()).map(stage -> stage.name().toLowerCase(Locale.ROOT)).toList();
        assertEquals(stages, categories.stream().skip(1).map(category -> category.getAttribute("level-id")).toList());
        for (int i = 1; i < categories.size(); i++) {
            assertEquals("/community/modestead", categories.get(i).getAttribute("path"));
            assertEquals(i == 1 ? "" : stages.get(i - 2), categories.get(i).getAttribute("after"));
        }
        assertTrue(categories.stream().allMatch(category -> category.getAttribute("locked").equals("false")
                && !category.getAttribute("description").isBlank()
                && PluginXmlTest.class.getResource("/" + category.getAttribute("icon")) != null));
    }

    @Test
    void everyTypedPortIsRegisteredWithSerializersThatNameTheirClass() throws Exception {
        Set<String> needed = Arrays.stream(PortType.values()).filter(type -> type != PortType.TABLE)
                .map(type -> StagePorts.objectClass(type).getName()).collect(Collectors.toSet());
        assertEquals(needed, elements("portType").stream().map(type -> type.getAttribute("objectClass")).collect(Collectors.toSet()));
        for (Element type : elements("portType")) {
            assertTrue(type.getAttribute("name").startsWith("Modestead "));
            assertTrue(type.getAttribute("color").matches("#[0-9A-F]{6}"), "the platform reads six hexadecimal digits");
            assertInstanceOf(PortObject.PortObjectSerializer.class, made(type.getAttribute("objectSerializer")));
            assertInstanceOf(PortObjectSpec.PortObjectSpecSerializer.class, made(type.getAttribute("specSerializer")));
            Class<?> object = Class.forName(type.getAttribute("objectClass"));
            assertEquals(type.getAttribute("specClass"), object.getMethod("getSpec").getReturnType().getName());
            assertTrue(Class.forName(type.getAttribute("objectSerializer")).getGenericSuperclass().getTypeName()
                    .contains("<" + object.getName() + ">"), "the platform finds the class through the type argument");
        }
        assertEquals(needed.size(), elements("portType").stream().map(type -> type.getAttribute("color")).distinct().count());
    }

    private static Object made(String name) throws Exception {
        return Class.forName(name).getConstructor().newInstance();
    }
}
