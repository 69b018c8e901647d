package org.modestead.knime.port;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;

/** Specs in workflows of every release can be read, and today's are written in the shape that is kept. */
class SpecXmlTest {

    private static final StageSpec SPEC = new StageSpec(PortType.SPECTRUM, new Outlook(
            List.of(new Channel("flow", "m3/h"), new Channel("sump level", "")), List.of(new Channel("valve", "%")),
            Optional.of(new TimeAxis(TimeAxis.Kind.DATE_TIME, "h"))));

    private static byte[] kept() throws IOException {
        try (InputStream in = SpecXmlTest.class.getResourceAsStream("/specs/version-1.xml")) {
            return in.readAllBytes();
        }
    }

    private static NodeSettings settings() throws IOException {
        try (InputStream in = SpecXmlTest.class.getResourceAsStream("/specs/version-1.xml")) {
            return (NodeSettings) NodeSettings.loadFromXML(in);
        }
    }

    @Test
    void theFirstVersionIsReadAndStillWritten() throws Exception {
        assertEquals(SPEC, SpecXml.read(settings()));
        NodeSettings written = new NodeSettings("spec");
        SpecXml.write(SPEC, written);
        ByteArrayOutputStream xml = new ByteArrayOutputStream();
        written.saveToXML(xml);
        assertEquals(new String(kept(), StandardCharsets.UTF_8), xml.toString(StandardCharsets.UTF_8));
    }

    /** What a release that knows no kernels in specs leaves alone. */
    @Test
    void theKernelIsKeptWhereItIsKnownAndToldOnItsPort() throws Exception {
        StageSpec known = new StageSpec(PortType.KERNEL, SPEC.outlook().withKernel("Gaussian (scale 0.5)"));
        NodeSettings written = new NodeSettings("spec");
        SpecXml.write(known, written);
        assertEquals(known, SpecXml.read(written));
        assertEquals("Gaussian (scale 0.5)", PortViews.facts(known).get(0).value());
        assertEquals("chosen from the data when the node runs", PortViews.facts(new StageSpec(PortType.KERNEL, SPEC.outlook())).get(0).value());
        assertEquals("channels", PortViews.facts(SPEC).get(0).item());
    }

    @Test
    void aLaterVersionIsRefusedWithASentence() throws Exception {
        NodeSettings later = settings();
        later.addInt("version", 2);
        InvalidSettingsException refused = assertThrows(InvalidSettingsException.class, () -> SpecXml.read(later));
        assertTrue(refused.getMessage().contains("use a newer release"), refused.getMessage());
    }

    @Test
    void brokenSpecsAreRefusedWithASentence() throws Exception {
        NodeSettings type = settings();
        type.addString("type", "WEATHER");
        assertTrue(assertThrows(InvalidSettingsException.class, () -> SpecXml.read(type)).getMessage().contains("unknown type"));
        NodeSettings units = settings();
        units.addStringArray("channels-units", "m3/h");
        assertEquals("2 channels have 1 units", assertThrows(InvalidSettingsException.class, () -> SpecXml.read(units)).getMessage());
    }
}
