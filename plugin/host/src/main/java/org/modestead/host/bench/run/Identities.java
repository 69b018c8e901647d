package org.modestead.host.bench.run;

import java.io.IOException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import org.modestead.host.run.FileMarks;
import org.modestead.host.run.Fingerprint;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.Survey;

/** What the result of each step would depend on if it ran now. */
public final class Identities {

    private Identities() {}

    /** Returns the identities, by step id, of all steps for which they can be told. */
    public static Map<String, String> of(Survey survey, Path baseFolder, FileMarks marks) {
        Map<String, String> known = new LinkedHashMap<>();
        for (String id : survey.order()) {
            PlannedStep step = survey.planned().get(id);
            if (step == null) {
                continue;
            }
            try {
                Fingerprint.identity(step, known, baseFolder, marks).ifPresent(identity -> known.put(id, identity));
            } catch (IOException unreadable) {
                // a file that cannot be read now: the step says so when it runs
                known.remove(id);
            }
        }
        return known;
    }
}
