package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.engine.wellposed.WellPosedness;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.EigenvaluePlane;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.LadderFigures;
import org.modestead.nodes.table.TableSchema;

/** Decides whether the modes exist, or are only the weights of one particular projection. */
public final class WellPosednessCheckerNode implements Node {

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("wellposedness-checker", "Well-posedness Checker", NodeDeclaration.Stage.JUDGE,
                "Decides whether each mode exists or belongs to one particular projection only, and names the checks"
                        + " that decided.",
                description(), List.of(
                        "Colbrook and Townsend, Rigorous data-driven computation of spectral properties of Koopman"
                                + " operators, Communications on Pure and Applied Mathematics 77:221, 2024",
                        "Trefethen and Embree, Spectra and Pseudospectra, Princeton University Press, 2005"),
                List.of("verdict", "validation", "residual", "spurious modes", "convergence", "existence",
                        "non-normality", "overlap"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "The snapshots that were fitted, or new ones"
                        + " from a Model Applier; the holdout part judges."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator with all its ranks."),
                        Port.of("spectrum", PortType.SPECTRUM, "Spectrum", "The modes to be judged.")),
                List.of(Port.of("verdict", PortType.VERDICT, "Verdict", "What may be said, overall and mode by mode."),
                        Port.table("findings", "Findings", "Verdict and checks of the operator as a whole (mode 0) and"
                                + " of each mode.",
                                FindingTable.SCHEMA),
                        Port.table("ladder", "Ladder", "Each mode on each rank; mode 0 is the strongest mode of the rank,"
                                + " whichever it is. The weight is that of an eigenfunction of unit norm in the space.", LadderTable.SCHEMA),
                        Port.table("modes", "Modes", "The mode table with its verdicts.", ModeTable.SCHEMA)),
                JudgeNodeSettings.declared(), 1);
    }

    private static String description() {
        return """
                A fit always returns eigenvalues. This node asks whether they belong to the system. It repeats the \
                decomposition on a ladder of ranks and looks whether rates and weights settle; whether each eigenfunction \
                stays bounded in the space or only imitates one on the sampled region; whether it obeys its own law on \
                data the fit never saw; whether eigenfunctions overlap; whether they hold the signal; whether another \
                step gives the same rates; and whether runs escape in finite time.

                The verdict stands: report the mode. Settles: report it together with what limits it. Drifts: the forecast \
                may be used, the mode must not be reported. Absent: there is no such mode in this space; try another \
                kernel. Undecided: too few data, and the finding says of what. Overall counts the worst verdict among \
                modes that carry a stated share of the signal. The constant function, which every motion has, is no \
                evidence.

                Every threshold is a setting; a verdict names the checks that decided it. Keep a holdout in the Snapshot \
                Builder, or the most telling check has nothing to look at.

                Where a mode matters for safety (pressure, structures, grids), a verdict is one piece of evidence and \
                does not replace local codes and licensed practice. Cost: one small eigenproblem a rung,
                and the functions evaluated on the holdout.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return JudgeNodeSettings.problems(settings);
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Spectrum spectrum = inputs.get("spectrum", Spectrum.class);
        Verdict verdict = verdict(inputs.get("snapshots", Snapshots.class), inputs.get("operator", FittedOperator.class), spectrum, settings, context);
        List<Figure> figures = new ArrayList<>();
        figures.add(EigenvaluePlane.figure(spectrum, Optional.of(verdict)));
        figures.addAll(LadderFigures.figures(spectrum, verdict));
        Map<String, Object> outputs = Map.of("verdict", verdict, "findings", FindingTable.of(verdict), "ladder",
                LadderTable.of(verdict), "modes", ModeTable.of(spectrum, Optional.of(verdict)));
        return new NodeResult(outputs, figures, summary(verdict), verdict.doubts());
    }

    private static Verdict verdict(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, Settings settings, RunContext context) {
        JudgeSettings thresholds = JudgeNodeSettings.read(settings);
        return JudgeNodeSettings.residualsOnly(settings) ? WellPosedness.residuals(snapshots, operator, spectrum, thresholds)
                : WellPosedness.judge(snapshots, operator, spectrum, thresholds, context.progress());
    }

    private static List<String> summary(Verdict verdict) {
        List<String> sentences = new ArrayList<>(List.of(verdict.overall().sentence()));
        verdict.modes().stream().filter(ModeVerdict::counts).map(ModeVerdict::sentence).forEach(sentences::add);
        return sentences;
    }
}
