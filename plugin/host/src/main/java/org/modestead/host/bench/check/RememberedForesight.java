package org.modestead.host.bench.check;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.modestead.engine.Fault;
import org.modestead.host.recent.RecentAnswers;
import org.modestead.host.workflow.Foresight;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;

/**
 * Remembers what steps said beforehand, so that an edit asks only those whose settings, inputs or files changed. A defect of a node
 * becomes a sentence, so that the desk goes on. Thread-safe.
 */
public final class RememberedForesight implements Foresight {

    private static final int MOST = 2000;

    private final RecentAnswers<Key, Seen> seen = new RecentAnswers<>(MOST);

    /**
     * What an answer depends on.
     *
     * @param node id
     * @param settings by key
     * @param folder against which files are resolved
     * @param arriving what is known of the inputs
     * @param files size and time of change of each file that the settings name
     */
    private record Key(String node, Map<String, Object> settings, Path folder, Expected arriving, List<String> files) {}

    @Override
    public Seen look(PlannedStep step, Expected arriving, RunContext context) {
        Key key = new Key(step.declaration().id(), step.settings().values(), context.baseFolder(), arriving, files(step, context.baseFolder()));
        Optional<Seen> known = seen.find(key);
        if (known.isPresent()) {
            return known.get();
        }
        Seen fresh = ask(step, arriving, context);
        seen.keep(key, fresh);
        return fresh;
    }

    private static Seen ask(PlannedStep step, Expected arriving, RunContext context) {
        try {
            return Foresight.DIRECT.look(step, arriving, context);
        } catch (RuntimeException | LinkageError defect) {
            return new Seen(List.of(), Optional.empty(), Optional.of(new DefectFault("check of its settings", "an error in the program ("
                    + defect.getClass().getSimpleName() + ": " + defect.getMessage() + ")", "change the settings, and report it")));
        }
    }

    private static List<String> files(PlannedStep step, Path folder) {
        Map<String, String> stamps = new TreeMap<>();
        for (Setting setting : step.declaration().settings()) {
            String name = setting instanceof Setting.File ? step.settings().text(setting.key()) : "";
            if (!name.isEmpty()) {
                stamps.put(setting.key(), stamp(folder, name));
            }
        }
        return stamps.entrySet().stream().map(entry -> entry.getKey() + " " + entry.getValue()).toList();
    }

    private static String stamp(Path folder, String name) {
        try {
            Path file = folder.resolve(name);
            return Files.size(file) + " " + Files.getLastModifiedTime(file);
        } catch (IOException | java.nio.file.InvalidPathException missing) {
            return "missing";
        }
    }

    /** A node's own check failed. */
    private static final class DefectFault extends Fault {
        private static final long serialVersionUID = 1L;

        DefectFault(String where, String seen, String wanted) {
            super(where, seen, wanted);
        }
    }
}
