package org.modestead.knime.describe;

import java.io.IOException;
import java.io.StringReader;
import java.util.List;
import java.util.stream.Collectors;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;
import org.w3c.dom.Element;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;

/** The description as one XML element of the platform's schema Node_v5.3. */
final class DescriptionXml {

    private static final String NAMESPACE = "http://knime.org/node/v5.3";

    private final DescriptionTexts texts;
    private final NodeDeclaration declaration;

    DescriptionXml(DescriptionTexts texts) {
        this.texts = texts;
        this.declaration = texts.declaration();
    }

    /** Returns the root element of a document of its own, because the platform adds to it. */
    Element element() {
        try {
            DocumentBuilderFactory factory = DocumentBuilderFactory.newDefaultInstance();
            factory.setNamespaceAware(true);
            return factory.newDocumentBuilder().parse(new InputSource(new StringReader(text()))).getDocumentElement();
        } catch (ParserConfigurationException | SAXException | IOException defect) {
            throw new IllegalStateException("the description of " + declaration.id() + " is not well-formed", defect);
        }
    }

    private String text() {
        return "<knimeNode xmlns=\"" + NAMESPACE + "\" icon=\"" + texts.icon() + "\" type=\"" + texts.type() + "\">"
                + "<name>" + Markup.text(declaration.title()) + "</name>"
                + "<shortDescription>" + Markup.text(declaration.purpose()) + "</shortDescription>"
                + "<fullDescription><intro>" + texts.intro() + "</intro>" + tabs() + "</fullDescription>"
                + "<ports>" + ports("inPort", declaration.inputs()) + ports("outPort", declaration.outputs()) + "</ports>"
                + "<views><view index=\"0\" name=\"" + DescriptionTexts.VIEW + "\">" + DescriptionTexts.VIEW_TEXT + "</view></views>"
                + keywords() + "</knimeNode>";
    }

    private String tabs() {
        StringBuilder tabs = new StringBuilder();
        texts.groups().forEach((name, settings) -> tabs.append("<tab name=\"").append(Markup.attribute(name)).append("\">")
                .append(settings.stream().map(this::option).collect(Collectors.joining())).append("</tab>"));
        return tabs.toString();
    }

    private String option(Setting setting) {
        return "<option name=\"" + Markup.attribute(setting.common().label()) + "\">" + texts.option(setting) + "</option>";
    }

    private String ports(String element, List<Port> ports) {
        StringBuilder all = new StringBuilder();
        for (int i = 0; i < ports.size(); i++) {
            all.append('<').append(element).append(" index=\"").append(i).append("\" name=\"")
                    .append(Markup.attribute(ports.get(i).title())).append("\">").append(texts.port(ports.get(i)))
                    .append("</").append(element).append('>');
        }
        return all.toString();
    }

    private String keywords() {
        return declaration.keywords().isEmpty() ? "" : declaration.keywords().stream().map(Markup::text)
                .collect(Collectors.joining("</keyword><keyword>", "<keywords><keyword>", "</keyword></keywords>"));
    }
}
