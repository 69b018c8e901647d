package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.SingularValues;
import org.modestead.nodes.table.TableSchema;

/** Fits the operator that carries the signal forward, in steps or in continuous time. */
public final class OperatorFitterNode implements Node {

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("operator-fitter", "Operator Fitter", NodeDeclaration.Stage.FIT,
                "Fits the operator that carries the signal forward: a map of one step or the generator in continuous"
                        + " time.",
                description(), List.of(
                        "Schmid, Dynamic mode decomposition of numerical and experimental data, Journal of Fluid"
                                + " Mechanics 656:5, 2010",
                        "Williams, Kevrekidis and Rowley, A data-driven approximation of the Koopman operator, Journal"
                                + " of Nonlinear Science 25:1307, 2015",
                        "Rosenfeld, Kamalapurkar, Gruss and Johnson, Dynamic mode decomposition for continuous time"
                                + " systems with the Liouville operator, Journal of Nonlinear Science 32:5, 2022",
                        "Gavish and Donoho, The optimal hard threshold for singular values is 4/√3, IEEE Transactions"
                                + " on Information Theory 60:5040, 2014",
                        "Hemati, Rowley, Deem and Cattafesta, De-biasing the dynamic mode decomposition for applied"
                                + " Koopman spectral analysis of noisy datasets, Theoretical and Computational Fluid"
                                + " Dynamics 31:349, 2017",
                        "Dawson, Hemati, Williams and Rowley, Characterizing and correcting for the effect of sensor noise"
                                + " in the dynamic mode decomposition, Experiments in Fluids 57:42, 2016",
                        "Proctor, Brunton and Kutz, Dynamic mode decomposition with control, SIAM Journal on Applied"
                                + " Dynamical Systems 15:142, 2016",
                        "Higham, The symmetric Procrustes problem, BIT 28:133, 1988",
                        "Baddoo, Herrmann, McKeon, Kutz and Brunton, Physics-informed dynamic mode decomposition, Proceedings of"
                                + " the Royal Society A 479:20220576, 2023",
                        "Colbrook, The mpEDMD algorithm for data-driven computations of measure-preserving dynamical systems,"
                                + " SIAM Journal on Numerical Analysis 61:1585, 2023",
                        "Noferini and Poloni, Nearest Ω-stable matrix via Riemannian optimization, Numerische Mathematik"
                                + " 148:817, 2021"),
                List.of("Koopman", "Liouville", "generator", "transfer operator", "least squares",
                        "total least squares", "noise", "control", "inputs", "forced motion", "self-adjoint", "unitary",
                        "measure-preserving", "stable", "damping bias", "singular values",
                        "rank",
                        "occupation kernel"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Prepared states; only the training part"
                        + " is fitted."),
                        Port.optional("kernel", PortType.KERNEL, "Kernel", "Function space; needed by the kernel step"
                                + " map and the generators.")),
                List.of(Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator up to the largest rank"
                        + " that the data support, with the rank chosen."),
                        Port.table("fit", "Fit", "What was fitted and how well it is conditioned.", FitTable.SCHEMA)),
                FitSettings.declared(), 2);
    }

    private static String description() {
        return """
                Looks at how functions of the state change from sample to sample, or along pieces of runs, and compresses \
                that to a small matrix over orthonormal functions. Leading parts of this matrix are fits of lower rank: \
                they are the rungs on which the Well-posedness Checker looks whether modes settle.

                Start with the linear step map in delay coordinates: it is fast and right for signals that are sums of \
                growing, decaying or steady oscillations. Use a dictionary or a kernel when the motion is nonlinear, and \
                a generator when samples are uneven or when some states escape in finite time, for then no step map \
                exists.

                The rank decides most: compare ranks, and let the checker judge. Least squares on noisy samples reports \
                too much damping; the linear step map can be corrected for that, by total least squares or by going \
                forward and backward. Compare both: where they disagree, the damping is not known well.

                Where the snapshots carry input columns, a step map on the coordinates or on a dictionary separates what \
                they drive: y = A x + B u, with all samples of the inputs that the state's delays reach over, a constant \
                for the resting point, and for monomials their products with the state. The operator A is that of the free motion.

                A structure known beforehand can be imposed: self-adjoint, skew-adjoint (generator), unitary (step map) or \
                stable. The fit table tells how much of the free fit it takes away; where that is much, the data disagree.

                Cost: linear and dictionary fits take samples times functions squared; kernel fits samples times \
                landmarks times rank; no square matrix of all samples is formed.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return FitSettings.problems(settings);
    }

    /** Version 1 knew nothing of inputs and left them in. */
    @Override
    public Map<String, Object> upgrade(Map<String, Object> stored, int version) {
        Map<String, Object> settings = new LinkedHashMap<>(stored);
        settings.putIfAbsent(FitSettings.INPUTS, "leave-in");
        return settings;
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Snapshots snapshots = inputs.get("snapshots", Snapshots.class);
        Optional<Kernel> kernel = inputs.find("kernel", Kernel.class);
        FitSettings.requireSeparable(settings, snapshots);
        Estimator estimator = FitSettings.estimator(settings, kernel);
        FittedOperator operator = OperatorFitter.fit(snapshots, estimator, FitSettings.rankRule(settings),
                settings.number(FitSettings.RIDGE), context.progress());
        List<Doubt> doubts = new ArrayList<>(operator.doubts());
        if (kernel.isPresent() && operator.kernel().isEmpty()) {
            doubts.add(new Doubt("kernel-unused", "A kernel is connected, but the operator " + operator.estimator()
                    + " uses none."));
        }
        String rank = "Rank " + operator.rank() + " of at most " + operator.functions().rank() + ": "
                + operator.rankChoice() + ".";
        return new NodeResult(Map.of("operator", operator, "fit", FitTable.of(operator,
                settings.number(FitSettings.RIDGE))),
                List.of(SingularValues.figure(operator)), List.of("Fitted: " + operator.method() + ".", rank), doubts);
    }
}
