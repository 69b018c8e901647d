package org.knime.core.node;

import java.util.List;
import java.util.Optional;
import org.w3c.dom.Element;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
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
        return Optional.empty();
    }

    public Optional<String> getShortDescription() {
        return Optional.empty();
    }

    public List<DialogOptionGroup> getDialogOptionGroups() {
        return List.of();
    }

    public List<DescriptionLink> getLinks() {
        return List.of();
    }

    public String[] getKeywords() {
        return new String[0];
    }

    /** One option of the dialog. */
    public static final class DialogOption {

        private final String name;
        private final String description;

        public DialogOption(final String name, final String description, final boolean optional) {
            this.name = name;
            this.description = description;
        }

        public String getName() {
            return name;
        }

        public String getDescription() {
            return description;
        }
    }

    /** Options under one heading. */
    public static final class DialogOptionGroup {

        private final String name;
        private final List<DialogOption> options;

        public DialogOptionGroup(final String name, final String description, final List<DialogOption> options) {
            this.name = name;
            this.options = options;
        }

        public String getName() {
            return name;
        }

        public List<DialogOption> getOptions() {
            return options;
        }
    }

    /** A link below the description. */
    public static final class DescriptionLink {

        public DescriptionLink(final String target, final String text) {
            // not read by tests
        }
    }
}
