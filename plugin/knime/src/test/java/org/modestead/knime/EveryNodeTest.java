package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeDescription;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.port.PortType;
import org.modestead.knime.port.StagePorts;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.SettingsReader;

/** What holds for every node that is offered. */
class EveryNodeTest {

    private static final ModesteadNodeSet SET = new ModesteadNodeSet();

    static List<String> ids() {
        return Rig.ids();
    }

    private static DeclaredNodeFactory factory(String id) throws InvalidSettingsException {
        DeclaredNodeFactory factory = new DeclaredNodeFactory();
        factory.loadAdditionalFactorySettings(SET.getAdditionalSettings(id));
        return factory;
    }

    @Test
    void theSixNodesThatDoTheWorkAreOfferedAndNoneThatReadsOrWritesTables() {
        assertTrue(SET.getNodeFactoryIds().containsAll(List.of("signal-generator", "snapshot-builder", "kernel-chooser", "operator-fitter",
                "spectrum-extractor", "wellposedness-checker", "forecast")));
        assertTrue(SET.getNodeFactoryIds().stream().noneMatch(id -> id.startsWith("table-")), SET.getNodeFactoryIds().toString());
        assertEquals(SET.getNodeFactoryIds().size(), new HashSet<>(SET.getNodeFactoryIds()).size());
    }

    @Test
    void nodesOfAStageFollowEachOtherInWorkingOrder() {
        List<String> known = SET.getNodeFactoryIds().stream().map(id -> DeclaredNodeFactory.class.getName() + "#" + id).toList();
        for (String id : SET.getNodeFactoryIds()) {
            String after = SET.getAfterID(id);
            assertTrue(after.isEmpty() || known.contains(after), after);
        }
        assertEquals("org.modestead.knime.DeclaredNodeFactory#spectrum-extractor", SET.getAfterID("wellposedness-checker"));
        assertEquals("/community/modestead/judge", SET.getCategoryPath("wellposedness-checker"));
    }

    @ParameterizedTest
    @MethodSource("ids")
    void theFactoryComesBackFromItsOwnSettings(String id) throws Exception {
        NodeSettings saved = new NodeSettings("factory");
        factory(id).saveAdditionalFactorySettings(saved);
        DeclaredNodeFactory again = new DeclaredNodeFactory();
        again.loadAdditionalFactorySettings(saved);
        assertEquals(id, again.getFactoryIdUniquifier());
        assertEquals(Rig.node(id).declaration().title(), again.description().getNodeName());
    }

    @Test
    void anUnknownNodeIsRefusedInASentence() {
        NodeSettings saved = new NodeSettings("factory");
        saved.addString("node", "crystal-ball");
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class,
                () -> new DeclaredNodeFactory().loadAdditionalFactorySettings(saved));
        assertTrue(refused.getMessage().startsWith("There is no node crystal-ball in this installation"), refused.getMessage());
    }

    @ParameterizedTest
    @MethodSource("ids")
    void portsAndViewsAreThoseOfDeclarationAndDescription(String id) throws Exception {
        DeclaredNodeFactory factory = factory(id);
        NodeDescription description = factory.description();
        NodeDeclaration declaration = Rig.node(id).declaration();
        Rig rig = Rig.of(id);
        assertPorts(declaration.inputs(), rig.engine().inputs());
        assertPorts(declaration.outputs(), rig.engine().outputs());
        for (int i = 0; i < declaration.inputs().size(); i++) {
            assertFalse(description.getInportName(i).isBlank());
            assertFalse(description.getInportDescription(i).isBlank());
        }
        for (int i = 0; i < declaration.outputs().size(); i++) {
            assertFalse(description.getOutportName(i).isBlank());
            assertFalse(description.getOutportDescription(i).isBlank());
        }
        assertEquals(null, description.getInportName(declaration.inputs().size()));
        assertEquals(null, description.getOutportName(declaration.outputs().size()));
        assertEquals(factory.views(), description.getViewCount());
        assertFalse(description.getViewDescription(0).isBlank());
    }

    private static void assertPorts(List<Port> declared, PortType[] made) {
        assertEquals(declared.size(), made.length);
        for (int i = 0; i < made.length; i++) {
            assertEquals(StagePorts.objectClass(declared.get(i).type()), made[i].getPortObjectClass());
            assertEquals(declared.get(i).optional(), made[i].isOptional());
        }
    }

    @ParameterizedTest
    @MethodSource("ids")
    void everyOptionIsDescribed(String id) throws Exception {
        List<String> described = new ArrayList<>();
        factory(id).description().getDialogOptionGroups().forEach(group -> group.getOptions().forEach(option -> {
            assertFalse(option.getDescription().isBlank(), option.getName());
            described.add(option.getName());
        }));
        List<String> declared = Rig.node(id).declaration().settings().stream().map(setting -> setting.common().label()).toList();
        assertTrue(described.containsAll(declared) && described.size() == declared.size(), id);
    }

    /** A node put into a workflow and never configured is saved and loaded like any other. */
    @ParameterizedTest
    @MethodSource("ids")
    void aFreshNodesSettingsAreSavedLoadedAndStayTheSame(String id) throws Exception {
        Rig fresh = Rig.of(id);
        NodeSettings saved = fresh.engine().saved();
        Rig loaded = Rig.of(id);
        loaded.engine().settings(saved);
        assertEquals(xml(saved), xml(loaded.engine().saved()));
    }

    /** All that the settings demand is there, or configure says in a sentence which setting lacks what. */
    @ParameterizedTest
    @MethodSource("ids")
    void aFreshNodeIsReadyOrSaysWhatIsMissing(String id) throws Exception {
        SettingsReader.Reading reading = SettingsReader.read(Rig.node(id), NativeSettings.read(Rig.node(id).declaration(), Rig.of(id).engine().saved()));
        SettingsReader.Reading defaults = SettingsReader.read(Rig.node(id), Map.of());
        assertEquals(defaults.settings(), reading.settings());
        assertEquals(defaults.problems(), reading.problems());
    }

    private static String xml(NodeSettings settings) throws Exception {
        java.io.ByteArrayOutputStream out = new java.io.ByteArrayOutputStream();
        settings.saveToXML(out);
        return out.toString(java.nio.charset.StandardCharsets.UTF_8);
    }
}
