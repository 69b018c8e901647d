package org.modestead.nodes.modal;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.AveragedPower;
import org.modestead.engine.spectrum.Pole;
import org.modestead.engine.spectrum.PoleLine;
import org.modestead.engine.spectrum.Stabilisation;
import org.modestead.engine.spectrum.StabilityLimits;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.StabilisationFigure;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;

/** Shows which poles stay as the model order grows. */
public final class StabilisationNode implements Node {

    private static final String LOWEST = "lowest-order";
    private static final String HIGHEST = "highest-order";
    private static final String EVERY = "order-step";
    private static final String FREQUENCY = "frequency-limit";
    private static final String DAMPING = "damping-limit";
    private static final String SHAPE = "shape-limit";
    private static final String LEAST = "least-orders";
    private static final long LARGEST = 10_000;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("stabilisation", "Stabilisation Diagram", NodeDeclaration.Stage.JUDGE,
                "Shows the poles of the fitted operator over the model order and marks those that stay.",
                description(), List.of(
                        "Peeters and De Roeck, Reference-based stochastic subspace identification for output-only modal analysis,"
                                + " Mechanical Systems and Signal Processing 13:855, 1999",
                        "Allemang and Brown, A correlation coefficient for modal vector analysis, Proceedings of the 1st"
                                + " International Modal Analysis Conference, 1982",
                        "Welch, The use of fast Fourier transform for the estimation of power spectra, IEEE Transactions on"
                                + " Audio and Electroacoustics 15:70, 1967"),
                List.of("stability diagram", "model order", "poles", "spurious modes", "modal analysis", "power spectrum"),
                List.of(Port.optional("snapshots", PortType.SNAPSHOTS, "Snapshots", "Recording whose power over frequency is"
                                + " drawn behind the poles; the operator's own when not connected."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator with all its ranks.")),
                List.of(Port.table("poles", "Poles", "Every pole at every order, and what it kept from the order before.", PoleTable.POLES),
                        Port.table("lines", "Lines", "Poles of many orders that belong together: middle value and spread.",
                                PoleTable.LINES)),
                settings(), 1);
    }

    private static String description() {
        return """
                A fit of higher order has more poles. Those of the system are found again at every order; those that fit noise \
                move. This node solves the eigenproblem at rising orders, which are nested ranks of one fit, matches the poles \
                of neighbouring orders by rate and shape, and tells of each whether its frequency, its damping ratio and its \
                shape stayed within limits. A conjugate pair is one pole.

                The shape is that of the newest sample over all channels; its likeness is the modal assurance \
                |a* b|²/((a* a)(b* b)). With one channel every shape is alike, and frequency and damping decide alone. A damping \
                ratio too small to change the signal by a tenth over the longest run counts as that small.

                Lines gather the poles of many orders that belong together: their middle values are estimates, their spread \
                says how much the order matters. A line can break off and be taken up again.

                Fit with enough delay samples that the highest order is several times the number of modes expected, and with a \
                rank rule that keeps the data, for orders end where the data end. Stable poles are a sign of modes, not a \
                verdict: that is for the Well-posedness Checker. Cost: the cube of the order, once an order.""";
    }

    private static List<Setting> settings() {
        return List.of(
                new Setting.Whole(new Common(LOWEST, "Lowest order", "Orders", "Model order, that is number of functions, to begin with."),
                        "", 1, LARGEST, OptionalLong.of(2)),
                new Setting.Whole(new Common(HIGHEST, "Highest order", "Orders", "Model order to end with; 0 takes three times the fitted"
                        + " rank, and at least 30, as far as the data hold."), "", 0, LARGEST, OptionalLong.of(0)),
                new Setting.Whole(new Common(EVERY, "Step", "Orders", "Distance between orders. An oscillation takes two functions, so"
                        + " steps of 2 are common practice."), "", 1, LARGEST, OptionalLong.of(2)),
                limit(FREQUENCY, "Change of frequency", "Largest relative change of the frequency from the order before for a pole that"
                        + " stays. Limits differ between trades; 0.01 is common practice.", StabilityLimits.DEFAULT.frequency()),
                limit(DAMPING, "Change of damping", "Largest relative change of the damping ratio, or of the growth rate of what does not"
                        + " oscillate. Damping scatters more than frequency; 0.05 is common practice.", StabilityLimits.DEFAULT.damping()),
                limit(SHAPE, "Likeness of shape", "Smallest modal assurance of the shape and the one of the order before; 0.98 is common"
                        + " practice.", StabilityLimits.DEFAULT.assurance()),
                new Setting.Whole(new Common(LEAST, "Orders of a line", "Lines", "Fewest orders at which a pole must be found for its line"
                        + " to be told. Raise it when noise makes lines by accident."), "orders", 2, LARGEST, OptionalLong.of(6)));
    }

    private static Setting limit(String key, String label, String help, double initial) {
        return new Setting.Number(new Common(key, label, "Limits", help), "", 0, true, 1, OptionalDouble.of(initial));
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        int lowest = settings.whole(LOWEST);
        int highest = settings.whole(HIGHEST);
        return highest > 0 && highest < lowest + settings.whole(EVERY) ? List.of(new SettingProblem(HIGHEST, "the highest order " + highest
                + " is not a step of " + settings.whole(EVERY) + " above the lowest order " + lowest,
                "give a highest order of at least " + (lowest + settings.whole(EVERY)) + ", or 0")) : List.of();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        FittedOperator operator = inputs.get("operator", FittedOperator.class);
        Snapshots snapshots = inputs.find("snapshots", Snapshots.class).orElse(operator.snapshots());
        TimeUnit unit = new TimeUnit(operator.snapshots().time().unit());
        int least = settings.whole(LEAST);
        Stabilisation found = Stabilisation.of(operator,
                new Stabilisation.Orders(settings.whole(LOWEST), settings.whole(HIGHEST), settings.whole(EVERY)),
                new StabilityLimits(settings.number(FREQUENCY), settings.number(DAMPING), settings.number(SHAPE)), context.progress());
        return new NodeResult(Map.of("poles", PoleTable.poles(found), "lines", PoleTable.lines(found, least)),
                List.of(StabilisationFigure.figure(found, AveragedPower.of(snapshots), operator.rank(), least, unit)),
                summary(found, least, unit), List.of());
    }

    private static List<String> summary(Stabilisation found, int least, TimeUnit unit) {
        List<PoleLine> lines = found.lines().stream().filter(line -> line.poles().size() >= least).toList();
        long stable = found.poles().stream().filter(Pole::stable).count();
        List<String> sentences = new ArrayList<>();
        sentences.add(stable + " of " + Sentence.count(found.poles().size(), "pole") + " at orders " + found.orders().get(0) + " to "
                + found.orders().get(found.orders().size() - 1) + " kept frequency, damping and shape from the order before.");
        List<PoleLine> oscillating = lines.stream().filter(line -> line.last().dampingRatio().isPresent()).toList();
        sentences.add(oscillating.isEmpty() ? "No oscillation is found again at " + least + " orders or more."
                : "Oscillations found at " + least + " orders or more: " + oscillating.stream().map(line -> told(line, unit))
                        .collect(Collectors.joining("; ")) + ".");
        return sentences;
    }

    private static String told(PoleLine line, TimeUnit unit) {
        return Digits.frequency(line.median(Pole::frequency), unit.frequency()) + ", damping ratio "
                + Digits.percent(line.median(pole -> pole.dampingRatio().orElse(1))) + " (" + line.poles().size() + " orders)";
    }
}
