package org.knime.core.node;

import java.util.List;
import java.util.Optional;
import org.w3c.dom.Element;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeDescription {
    public abstract String getIconPath();

    public abstract String getInportDescription(int index);

    public abstract String getInportName(int index);

    public abstract String getOutportDescription(int index);

    public abstract String getOutportName(int index);

    public abstract String getInteractiveViewName();

    public abstract String getNodeName();

    public abstract NodeFactory.NodeType getType();

    public abstract int getViewCount();

    public abstract String getViewDescription(int index);

    public abstract String getViewName(int index);

    public abstract Element getXMLDescription();

    public Optional<String> getIntro() {
        throw new UnsupportedOperationException();
    }

    public Optional<String> getShortDescription() {
        throw new UnsupportedOperationException();
    }

    public List<DialogOptionGroup> getDialogOptionGroups() {
        throw new UnsupportedOperationException();
    }

    public List<DescriptionLink> getLinks() {
        throw new UnsupportedOperationException();
    }

    public String[] getKeywords() {
        throw new UnsupportedOperationException();
    }

    /** One option of the dialog. */
    public static final class DialogOption {

        public DialogOption(final String name, final String description, final boolean optional) {
            throw new UnsupportedOperationException();
        }
    }

    /** Options under one heading. */
    public static final class DialogOptionGroup {

        public DialogOptionGroup(final String name, final String description, final List<DialogOption> options) {
            throw new UnsupportedOperationException();
        }
    }

    /** A link below the description. */
    public static final class DescriptionLink {

        public DescriptionLink(final String target, final String text) {
            throw new UnsupportedOperationException();
        }
    }
}
