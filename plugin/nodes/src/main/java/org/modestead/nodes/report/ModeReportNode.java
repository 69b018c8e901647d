package org.modestead.nodes.report;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.table.Table;

/** Gathers what the other nodes found into a report for people. */
public final class ModeReportNode implements Node {
    private static final String SNAPSHOTS = "snapshots";
    private static final String OPERATOR = "operator";
    private static final String SPECTRUM = "spectrum";
    private static final String VERDICT = "verdict";
    private static final String FORECAST = "forecast";
    private static final String RECONSTRUCTION = "reconstruction";
    private static final String SCORES = "scores";
    private static final String REPORT = "report";
    private static final String TITLE = "title";
    private static final String NOTES = "notes";
    private static final String MODES = "modes";
    private static final String CHANNELS = "channels";

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("mode-report", "Mode Report", NodeDeclaration.Stage.REPORT,
                "Gathers modes, verdicts and forecast into a report that an engineer can act on.",
                """
                Writes, in this order: a summary in plain words; the modes with their figures, the complex plane and the mode \
                shapes; whether each mode exists, with the checks that decided it; the forecast with its bands and its scores \
                against naive methods; the method and its limits; the quality of the data; what to do next; doubts and cautions.

                Connect as much as there is. Only the spectrum is needed; without a verdict the report says that nobody has \
                judged whether the modes exist, and without the recording it draws no time series.

                It computes nothing anew: every figure comes from the node that is connected. The host writes the report as one \
                page that opens without a network; the output table holds the same text row by row.""",
                List.of(), List.of("summary", "document", "HTML", "print", "hand over"), inputs(),
                List.of(Port.table(REPORT, "Report", "What the report says, one row a statement.", ReportRows.SCHEMA)),
                settings(), 1);
    }

    private static List<Port> inputs() {
        return List.of(
                Port.optional(SNAPSHOTS, PortType.SNAPSHOTS, "Snapshots", "The prepared recording; the operator's when"
                + " not connected."),
                Port.optional(OPERATOR, PortType.OPERATOR, "Operator", "What was fitted."),
                Port.of(SPECTRUM, PortType.SPECTRUM, "Spectrum", "The modes."),
                Port.optional(VERDICT, PortType.VERDICT, "Verdict", "Whether the modes exist."),
                Port.optional(FORECAST, PortType.TABLE, "Forecast", "Forecast table of the Reconstruction and Forecast"
                + " node."),
                Port.optional(RECONSTRUCTION, PortType.TABLE, "Reconstruction",
                        "Reconstruction table of the Reconstruction and Forecast node."),
                Port.optional(SCORES, PortType.TABLE, "Scores", "Score table of the Reconstruction and Forecast node."));
    }

    private static List<Setting> settings() {
        return List.of(
                new Setting.Text(new Common(TITLE, "Title", "Report", "First line of the report, for example the name of"
                + " the machine."),
                        "Mode report", false, true),
                new Setting.Text(new Common(NOTES, "Notes", "Report", "What a reader should know first, for example why"
                + " the recording"
                        + " was made. Stands at the head of the summary."), "", true, false),
                new Setting.Whole(new Common(MODES, "Modes told one by one", "Report",
                "How many of the strongest modes get a headline,"
                        + " shapes and the account of their checks. The table lists more."), "", 1, 20, OptionalLong.of(4)),
                new Setting.Whole(new Common(CHANNELS, "Channels drawn", "Report",
                "How many channels, from the first one, are drawn in"
                        + " time series."), "", 1, 20, OptionalLong.of(2)));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        ReportSource source = source(inputs, settings);
        context.progress().report(0.3, "writing the report");
        List<Section> sections = List.of(SummarySection.of(source, settings.text(NOTES)), ModesSection.of(source),
                ExistenceSection.of(source), ForecastSection.of(source), MethodSection.of(source), LimitsSection.of(source),
                DataSection.of(source), NextSection.of(source), DoubtsSection.of(source.doubts()));
        context.progress().checkCancelled();
        ReportDocument document = new ReportDocument(settings.text(TITLE), "", sections);
        return new NodeResult(Map.of(REPORT, ReportRows.of(document)), List.of(), SummarySection.sentences(source),
                List.of(),
                Optional.of(document));
    }

    private static ReportSource source(NodeInputs inputs, Settings settings) {
        Optional<FittedOperator> operator = inputs.find(OPERATOR, FittedOperator.class);
        Optional<Snapshots> snapshots = inputs.find(SNAPSHOTS, Snapshots.class)
                .or(() -> operator.map(FittedOperator::snapshots));
        int channels = settings.whole(CHANNELS);
        ForecastRows forecast = ForecastRows.read(inputs.find(FORECAST, Table.class),
                inputs.find(RECONSTRUCTION, Table.class),
                inputs.find(SCORES, Table.class), snapshots, channels);
        return new ReportSource(snapshots, operator, inputs.get(SPECTRUM, Spectrum.class),
                inputs.find(VERDICT, Verdict.class), forecast,
                settings.whole(MODES), channels);
    }
}
