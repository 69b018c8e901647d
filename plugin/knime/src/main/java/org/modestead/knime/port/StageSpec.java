package org.modestead.knime.port;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.Objects;
import javax.swing.JComponent;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectSpecZipInputStream;
import org.knime.core.node.port.PortObjectSpecZipOutputStream;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;

/**
 * What is known of a value before it is there, for {@code configure} of the nodes downstream: of which channels, with which units and
 * times, it is made. New data must have these columns.
 *
 * @param type what travels
 * @param outlook what it is made of; {@link Outlook#NONE} while nothing is known
 */
public record StageSpec(PortType type, Outlook outlook) implements PortObjectSpec {

    /** Checks that both parts are there. */
    public StageSpec {
        Objects.requireNonNull(type);
        Objects.requireNonNull(outlook);
    }

    @Override
    public JComponent[] getViews() {
        return new JComponent[] {PortViews.of(this)};
    }

    /** Writes specs as the platform's XML, one file in its zip. */
    public static final class Serializer extends PortObjectSpecSerializer<StageSpec> {
        private static final String ENTRY = "spec.xml";

        @Override
        public void savePortObjectSpec(StageSpec spec, PortObjectSpecZipOutputStream out) throws IOException {
            NodeSettings settings = new NodeSettings("spec");
            SpecXml.write(spec, settings);
            ByteArrayOutputStream xml = new ByteArrayOutputStream();
            settings.saveToXML(xml);
            out.putNextEntry(Entries.named(ENTRY));
            xml.writeTo(out);
            out.closeEntry();
        }

        @Override
        public StageSpec loadPortObjectSpec(PortObjectSpecZipInputStream in) throws IOException {
            byte[] xml = Entries.open(in, ENTRY).readAllBytes();
            try {
                return SpecXml.read(NodeSettings.loadFromXML(new ByteArrayInputStream(xml)));
            } catch (InvalidSettingsException broken) {
                throw new IOException("The spec of a port cannot be read: " + broken.getMessage(), broken);
            }
        }
    }
}
