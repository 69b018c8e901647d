package org.modestead.host.bench.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;

/** Edits of links. */
public sealed interface LinkEdit extends Edit {

    /**
     * Links an output to an input.
     *
     * @param link to be drawn
     * @param replace whether it may take the place of a link that feeds the input already
     */
    record Connect(Link link, boolean replace) implements LinkEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            LinkRules.refusal(before, catalog, link).ifPresent(fault -> {
                throw fault;
            });
            Optional<Link> feeding = LinkRules.feeding(before, link.to());
            if (feeding.isPresent() && !replace) {
                throw new EditFault("link " + link.from() + " to " + link.to(), link.to() + " is already fed by " + feeding.get().from(),
                        "remove that link first, or replace it");
            }
            List<Link> links = new ArrayList<>(before.links());
            feeding.ifPresent(links::remove);
            links.add(link);
            return Change.of(before.with(before.steps(), links));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Link " + StepTitles.of(before, catalog, link.from().step()) + " to " + StepTitles.of(before, catalog, link.to().step());
        }
    }

    /** Removes a link. */
    record Disconnect(Link link) implements LinkEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            if (!before.links().contains(link)) {
                throw new EditFault("link " + link.from() + " to " + link.to(), "there is no such link", "choose a link that is there");
            }
            return Change.of(before.with(before.steps(), before.links().stream().filter(other -> !other.equals(link)).toList()));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Remove the link from " + StepTitles.of(before, catalog, link.from().step()) + " to " + StepTitles.of(before, catalog, link.to().step());
        }
    }
}
