package org.knime.core.node;

import java.io.IOException;
import java.io.InputStream;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.knime.core.node.config.Config;
import org.knime.core.node.config.base.ConfigBase;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.xml.sax.SAXException;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class NodeSettings extends Config implements NodeSettingsRO, NodeSettingsWO {

    public NodeSettings(final String key) {
        super(key);
    }

    public static NodeSettingsRO loadFromXML(final InputStream in) throws IOException {
        try {
            Element root = DocumentBuilderFactory.newDefaultInstance().newDocumentBuilder().parse(in).getDocumentElement();
            NodeSettings settings = new NodeSettings(root.getAttribute("key"));
            settings.fill(root);
            return settings;
        } catch (SAXException | ParserConfigurationException broken) {
            throw new IOException(broken);
        }
    }

    private void fill(final Element from) {
        for (Node child = from.getFirstChild(); child != null; child = child.getNextSibling()) {
            if (child instanceof Element element && element.getTagName().equals("config")) {
                NodeSettings part = new NodeSettings(element.getAttribute("key"));
                part.fill(element);
                entries.put(element.getAttribute("key"), part);
            } else if (child instanceof Element element) {
                String value = element.getAttribute("value");
                entries.put(element.getAttribute("key"), switch (element.getAttribute("type")) {
                    case "xint" -> Integer.valueOf(value);
                    case "xlong" -> Long.valueOf(value);
                    case "xdouble" -> Double.valueOf(value);
                    case "xboolean" -> Boolean.valueOf(value);
                    default -> "true".equals(element.getAttribute("isnull")) ? null : value;
                });
            }
        }
    }

    @Override
    protected ConfigBase child(final String key) {
        return new NodeSettings(key);
    }

    @Override
    public NodeSettingsWO addNodeSettings(final String key) {
        return (NodeSettings) addConfig(key);
    }

    @Override
    public NodeSettings getNodeSettings(final String key) throws InvalidSettingsException {
        return (NodeSettings) getConfig(key);
    }
}
