package org.modestead.knime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.NodeResult;

/** What of a result must not stay in the view alone: the warning on the node and the word of the verdict. */
final class Notices {

    private static final int MOST_LINES = 6;
    private static final String MISSING = "missing cells";

    private final NodeResult result;

    Notices(NodeResult result) {
        this.result = result;
    }

    /** Returns the word of the overall verdict. */
    Optional<String> verdict() {
        return passed().map(verdict -> verdict.overall().grade().word());
    }

    /** Returns one line a notice, the verdict first; the platform shows one text only. */
    Optional<String> warning() {
        List<String> lines = new ArrayList<>();
        passed().filter(verdict -> warns(verdict.overall().grade()))
                .ifPresent(verdict -> lines.add("Verdict " + verdict.overall().grade().word() + ": " + verdict.overall().sentence()));
        missingCells().ifPresent(lines::add);
        result.doubts().stream().map(Doubt::sentence).forEach(lines::add);
        if (lines.size() > MOST_LINES) {
            int left = lines.size() - MOST_LINES + 1;
            lines.subList(MOST_LINES - 1, lines.size()).clear();
            lines.add("And " + left + " more; the view tells all.");
        }
        return lines.isEmpty() ? Optional.empty() : Optional.of(String.join("\n", lines));
    }

    private static boolean warns(Grade grade) {
        return grade != Grade.STANDS && grade != Grade.SETTLES;
    }

    private Optional<Verdict> passed() {
        return first(Verdict.class);
    }

    private Optional<String> missingCells() {
        return first(Snapshots.class).flatMap(snapshots -> snapshots.facts().stream().filter(fact -> fact.item().equals(MISSING))
                .findFirst()).filter(fact -> !fact.value().startsWith("0 ") && !fact.value().equals("none"))
                .map(fact -> "Missing cells: " + fact.value() + ".");
    }

    private <T> Optional<T> first(Class<T> type) {
        return result.outputs().values().stream().filter(type::isInstance).map(type::cast).findFirst();
    }
}
