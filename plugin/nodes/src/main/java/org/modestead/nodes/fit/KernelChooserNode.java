package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.choose.KernelRanking;
import org.modestead.engine.choose.RankedKernel;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelFamily;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.kernel.ModeRoom;
import org.modestead.engine.kernel.ScaleHeuristic;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.RankingFigure;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.TimeUnit;

/** Chooses the function space through which the signal is looked at. */
public final class KernelChooserNode implements Node {

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("kernel-chooser", "Kernel Chooser", NodeDeclaration.Stage.FIT,
                "Chooses the kernel, that is the functions through which the signal is looked at, by hand or by ranking.",
                description(), List.of("Aronszajn, Theory of reproducing kernels, Transactions of the AMS 68:337, 1950",
                        "Breiman, Friedman, Olshen and Stone, Classification and Regression Trees, Wadsworth, 1984",
                        "Steinwart, Hush and Scovel, An explicit description of the reproducing kernel Hilbert spaces"
                                + " of Gaussian RBF kernels, IEEE Transactions on Information Theory 52:4635, 2006"),
                List.of("kernel", "reproducing kernel", "Gaussian", "Matern", "length scale", "bandwidth", "feature"
                        + " space"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Prepared states from which the length"
                        + " scale is taken and on which kernels are compared.")),
                List.of(Port.of("kernel", PortType.KERNEL, "Kernel", "The chosen kernel."),
                        Port.table("ranking", "Ranking", "The kernels compared, best first; one row when nothing was"
                                + " compared.",
                                RankingTable.SCHEMA)),
                KernelSettings.declared(), 1);
    }

    private static String description() {
        return """
                A kernel K(x, y) stands for a space of functions of the state. Whether a mode exists is a question about \
                this space: the same motion may have orthogonal modes in one space and none in another. Say which space \
                was used whenever you report a mode.

                The exponential dot product exp(rate x·y) holds all polynomials; the polynomial kernel holds those up to \
                its degree; the linear kernel holds linear functions only. Gaussian, Laplacian and Matérn kernels hold no \
                polynomial and no constant, and their functions fade far off: forecasts through them may be good while \
                modes that grow or decay cannot exist in them.

                By ranking, each candidate is fitted to three quarters of the training samples and predicts the rest; the \
                holdout is not touched. The best of each family are then judged on the same split: do their modes settle, \
                predict and carry the signal? The order is by verdict first. Under one verdict the smaller error comes \
                first, but among errors that are equal within noise (one standard error of the paired differences) the \
                simplest kernel: smallest rank, then smallest scale. Kernels that were not judged follow those that were.

                A small error alone says that the space forecasts well, not that modes exist in it. The verdict here comes \
                from a part of the training samples at a small rank: it chooses a space, and the Well-posedness Checker has \
                the last word. Each row also tells which modes the space can hold at all. Cost grows with candidates times \
                samples times the square of the rank; judging takes about as long again.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        if (settings.text(KernelSettings.CHOOSE).equals(KernelSettings.RANK)) {
            return unknownCandidates(settings);
        }
        return parameterProblem(settings).map(List::of).orElse(List.of());
    }

    private static List<SettingProblem> unknownCandidates(Settings settings) {
        List<String> known = KernelFamilies.all().stream().map(KernelFamily::id).toList();
        List<String> named = settings.texts(KernelSettings.CANDIDATES);
        List<SettingProblem> problems = new ArrayList<>();
        if (named.isEmpty()) {
            problems.add(new SettingProblem(KernelSettings.CANDIDATES, "no family is named",
                    "name at least one of " + String.join(", ", known)));
        }
        named.stream().filter(id -> !known.contains(id)).forEach(id -> problems.add(new SettingProblem(
                KernelSettings.CANDIDATES,
                "there is no family " + id + NearestName.hint(id, known), "use one of " + String.join(", ", known))));
        return problems;
    }

    /** The families check their own parameters; with a scale from the data there is nothing left to check here. */
    private static Optional<SettingProblem> parameterProblem(Settings settings) {
        if (KernelSettings.needsMedian(settings)) {
            return Optional.empty();
        }
        try {
            KernelFamilies.create(KernelSettings.fixed(settings, Double.NaN));
            return Optional.empty();
        } catch (FitFault wrong) {
            return Optional.of(new SettingProblem(KernelSettings.FAMILY, wrong.seen(), wrong.wanted()));
        }
    }

    /** The kernel is known before the data are there when it is given by hand; of one whose scale comes from the data, the family is. */
    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Outlook recording = inputs.values().getOrDefault("snapshots", Outlook.NONE);
        return new Expected(Map.of(), Map.of("kernel", KernelSettings.foreseen(settings).map(recording::withKernel).orElse(recording)));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Snapshots snapshots = inputs.get("snapshots", Snapshots.class);
        double median = KernelSettings.needsMedian(settings)
                ? ScaleHeuristic.medianDistance(TrainingStates.of(snapshots)) : Double.NaN;
        if (settings.text(KernelSettings.CHOOSE).equals(KernelSettings.RANK)) {
            return ranked(snapshots, settings, median, context);
        }
        KernelSpec spec = KernelSettings.fixed(settings, median);
        Kernel kernel = KernelFamilies.create(spec);
        RankedKernel only = new RankedKernel(spec, 0, Double.NaN, Double.NaN, Optional.empty(), kernel.space().room(),
                "chosen by hand");
        return result(kernel, List.of(only), List.of("The kernel is " + spec.label() + "."), List.of(), List.of());
    }

    private static NodeResult ranked(Snapshots snapshots, Settings settings, double median, RunContext context) {
        List<RankedKernel> rows = KernelRanking.rank(snapshots, KernelSettings.candidates(settings, median),
                KernelSettings.plan(settings), context.progress());
        RankedKernel best = rows.get(0);
        if (!best.fitted()) {
            throw new FitFault("kernel ranking", "none of the " + rows.size() + " kernels could be fitted ("
                    + best.note() + ")",
                    "choose other families or scales, or give more data");
        }
        RankingWords words = new RankingWords(rows, settings.whole(KernelSettings.STEPS),
                new TimeUnit(snapshots.time().unit()));
        List<Doubt> doubts = new ArrayList<>(words.doubts());
        if (!snapshots.inputs().isEmpty()) {
            doubts.add(new Doubt("inputs-not-separated", "Kernels are compared with the inputs left in: what they drive counts as free"
                    + " motion."));
        }
        return result(KernelFamilies.create(best.kernel()), rows, words.summary(), doubts,
                RankingFigure.of(rows, settings.whole(KernelSettings.STEPS)).stream().toList());
    }

    private static NodeResult result(Kernel kernel, List<RankedKernel> rows, List<String> chosen, List<Doubt> doubts,
            List<Figure> figures) {
        List<String> summary = new ArrayList<>(chosen);
        if (kernel.space().room() != ModeRoom.UNKNOWN) {
            summary.add("The space of the kernel holds " + kernel.space().room().statement() + ".");
        }
        if (!kernel.space().sentence().isEmpty()) {
            summary.add(kernel.space().sentence());
        }
        return new NodeResult(Map.of("kernel", kernel, "ranking", RankingTable.of(rows)), figures, summary, doubts);
    }
}
