package org.modestead.host.workflow;

import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * A workflow as written in its file, not yet checked against the nodes.
 *
 * @param name for people
 * @param file where it was read from, absolute
 * @param steps in file order
 * @param links in file order
 * @param notes remarks on the whole; empty for none
 */
public record Workflow(String name, Path file, List<Step> steps, List<Link> links, String notes) {

    /** Takes immutable copies. */
    public Workflow {
        Objects.requireNonNull(name);
        Objects.requireNonNull(file);
        Objects.requireNonNull(notes);
        steps = List.copyOf(steps);
        links = List.copyOf(links);
    }

    /** A workflow without remarks. */
    public Workflow(String name, Path file, List<Step> steps, List<Link> links) {
        this(name, file, steps, links, "");
    }

    /** Returns the folder against which file settings are resolved. */
    public Path baseFolder() {
        return file.getParent();
    }

    /** Returns the file's name, for messages. */
    public String fileName() {
        return file.getFileName().toString();
    }

    /** Returns a step by its id. */
    public Optional<Step> step(String id) {
        return steps.stream().filter(step -> step.id().equals(id)).findFirst();
    }

    /** The same workflow with other steps and links. */
    public Workflow with(List<Step> otherSteps, List<Link> otherLinks) {
        return new Workflow(name, file, otherSteps, otherLinks, notes);
    }

    /** The same workflow kept in another file. */
    public Workflow in(Path other) {
        return new Workflow(name, other, steps, links, notes);
    }
}
