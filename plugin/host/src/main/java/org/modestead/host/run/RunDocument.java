package org.modestead.host.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.report.RunReport;
import org.modestead.nodes.report.StepAccount;

/** The report of a run: what the steps that were done have to say, under a warning when others were not. */
public final class RunDocument {

    private RunDocument() {}

    /** Returns the report of a run. */
    public static ReportDocument of(RunResult result) {
        List<StepAccount> accounts = new ArrayList<>();
        List<String> missing = new ArrayList<>();
        for (PlannedStep step : result.plan().order()) {
            StepOutcome outcome = result.outcomes().get(step.id());
            if (outcome instanceof StepOutcome.Done done) {
                accounts.add(new StepAccount(step.id(), step.declaration().title(), step.declaration().stage(),
                        done.result(),
                        settings(step)));
            } else {
                missing.add(outcome instanceof StepOutcome.Failed failed ? failed.sentence() : "step " + step.id()
                        + ": left out, because a step that it takes input from gave no result.");
            }
        }
        ReportDocument document = RunReport.assemble(result.plan().workflow().name(), accounts, versions());
        return missing.isEmpty() ? document : warned(document, missing);
    }

    private static ReportDocument warned(ReportDocument document, List<String> missing) {
        List<Block> warning = List.of(new Callout(Tone.STOP, "These results are not complete", missing));
        List<Section> sections = new ArrayList<>(List.of(new Section("failures", "What could not be done", warning)));
        sections.addAll(document.sections());
        return new ReportDocument(document.title(), document.subtitle(), sections);
    }

    private static Map<String, String> settings(PlannedStep step) {
        Map<String, String> settings = new LinkedHashMap<>();
        for (Setting setting : step.declaration().settings()) {
            Object value = step.settings().values().get(setting.key());
            if (value != null && !value.equals("") && !value.equals(List.of())) {
                settings.put(setting.key(), value instanceof List<?> list
                        ? list.stream().map(String::valueOf).collect(Collectors.joining(", ")) : value.toString());
            }
        }
        return settings;
    }

    private static Map<String, String> versions() {
        Map<String, String> versions = new LinkedHashMap<>();
        versions.put("Modestead", Versions.modestead());
        versions.put("Linear algebra", Versions.linearAlgebra());
        versions.put("Java", System.getProperty("java.version"));
        return versions;
    }
}
