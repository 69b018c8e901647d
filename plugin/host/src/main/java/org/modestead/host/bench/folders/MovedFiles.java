package org.modestead.host.bench.folders;

import java.io.IOException;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Setting;

/**
 * A workflow's way into a file of another folder: names of files that were said from the old folder are said from the new one, so that
 * every step reads and writes the files it did. Only settings that are declared as files are touched, and full names stay.
 *
 * @param catalog nodes that may be used
 * @param file where the workflow goes, absolute
 */
public record MovedFiles(NodeCatalog catalog, Path file) {

    /** Returns the workflow in its new file. */
    public Workflow moved(Workflow workflow) {
        Workflow there = workflow.in(file);
        return workflow.baseFolder().equals(there.baseFolder()) ? there
                : there.with(workflow.steps().stream().map(step -> step.with(settings(step, workflow.baseFolder()))).toList(), workflow.links());
    }

    /** Tells in a sentence what moving changed; empty when it changed no name. */
    public static String told(Workflow workflow, Workflow there) {
        long changed = workflow.steps().stream().filter(step -> !there.steps().contains(step)).count();
        return changed == 0 ? "" : "The folder is another one: file names in " + (changed == 1 ? "1 step" : changed + " steps")
                + " were written anew, so that they mean the same files as before.";
    }

    private Map<String, Object> settings(Step step, Path from) {
        Map<String, Object> settings = new LinkedHashMap<>(step.settings());
        catalog.find(step.node()).ifPresent(node -> node.declaration().settings().stream().filter(Setting.File.class::isInstance)
                .forEach(setting -> settings.computeIfPresent(setting.key(), (key, value) -> value instanceof String name ? name(name, from) : value)));
        return settings;
    }

    private String name(String name, Path from) {
        try {
            return name.isBlank() || Path.of(name).isAbsolute() ? name : fromNewFolder(from.resolve(name).normalize());
        } catch (InvalidPathException broken) {
            // no name of a file before, none after
            return name;
        }
    }

    private String fromNewFolder(Path meant) {
        Path folder = file.getParent();
        Optional<Path> way = meant.getRoot().equals(folder.getRoot()) ? Optional.of(folder.relativize(meant)) : Optional.empty();
        return way.filter(relative -> meant.startsWith(folder) || isNoLink(folder)).orElse(meant).toString().replace(meant.getFileSystem().getSeparator(), "/");
    }

    /** The way up from a folder that is reached by a link leads elsewhere than its name says. */
    private static boolean isNoLink(Path folder) {
        try {
            return folder.toRealPath().equals(folder);
        } catch (IOException unknown) {
            return false;
        }
    }
}
