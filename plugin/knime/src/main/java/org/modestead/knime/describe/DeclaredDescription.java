package org.modestead.knime.describe;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.knime.core.node.NodeDescription;
import org.knime.core.node.NodeFactory.NodeType;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.w3c.dom.Element;

/** What the platform shows of a node before it is used, all of it made from the declaration. */
public final class DeclaredDescription extends NodeDescription {

    /** Flow variable in which a node that judges leaves its overall verdict, in one word. */
    public static final String VERDICT_VARIABLE = "modestead-verdict";

    private final NodeDeclaration declaration;
    private final DescriptionTexts texts;
    private final Element xml;

    /** @param declaration of the node */
    public DeclaredDescription(NodeDeclaration declaration) {
        this.declaration = declaration;
        this.texts = new DescriptionTexts(declaration);
        this.xml = new DescriptionXml(texts).element();
    }

    @Override
    public String getIconPath() {
        return texts.icon();
    }

    @Override
    public String getNodeName() {
        return declaration.title();
    }

    @Override
    public NodeType getType() {
        return texts.type();
    }

    @Override
    public Optional<String> getShortDescription() {
        return Optional.of(declaration.purpose());
    }

    @Override
    public Optional<String> getIntro() {
        return Optional.of(texts.intro());
    }

    @Override
    public List<DialogOptionGroup> getDialogOptionGroups() {
        List<DialogOptionGroup> groups = new ArrayList<>();
        texts.groups().forEach((name, settings) -> groups.add(new DialogOptionGroup(name, null, settings.stream()
                .map(setting -> new DialogOption(setting.common().label(), texts.option(setting), false)).toList())));
        return groups;
    }

    @Override
    public List<DescriptionLink> getLinks() {
        return List.of();
    }

    @Override
    public String[] getKeywords() {
        return declaration.keywords().toArray(String[]::new);
    }

    @Override
    public String getInportName(int index) {
        return name(declaration.inputs(), index);
    }

    @Override
    public String getInportDescription(int index) {
        return description(declaration.inputs(), index);
    }

    @Override
    public String getOutportName(int index) {
        return name(declaration.outputs(), index);
    }

    @Override
    public String getOutportDescription(int index) {
        return description(declaration.outputs(), index);
    }

    @Override
    public int getViewCount() {
        return 1;
    }

    @Override
    public String getViewName(int index) {
        return index == 0 ? DescriptionTexts.VIEW : null;
    }

    @Override
    public String getViewDescription(int index) {
        return index == 0 ? DescriptionTexts.VIEW_TEXT : null;
    }

    /** There is none: the platform's word for it is null. */
    @Override
    public String getInteractiveViewName() {
        return null;
    }

    @Override
    public Element getXMLDescription() {
        return xml;
    }

    private static String name(List<Port> ports, int index) {
        return index < ports.size() ? ports.get(index).title() : null;
    }

    private String description(List<Port> ports, int index) {
        return index < ports.size() ? texts.port(ports.get(index)) : null;
    }
}
