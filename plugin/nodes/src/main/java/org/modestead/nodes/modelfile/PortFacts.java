package org.modestead.nodes.modelfile;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Fingerprint;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;

/** Says in a few lines what a value is. */
final class PortFacts {

    private PortFacts() {}

    static List<PortFact> of(Object value) {
        if (value instanceof Snapshots snapshots) {
            return snapshots(snapshots);
        }
        if (value instanceof Kernel kernel) {
            return List.of(new PortFact("kernel", kernel.spec().label()), new PortFact("holds", kernel.space().room().phrase()));
        }
        if (value instanceof FittedOperator operator) {
            return operator(operator);
        }
        if (value instanceof Spectrum spectrum) {
            return spectrum(spectrum);
        }
        if (value instanceof Verdict verdict) {
            return verdict(verdict);
        }
        return value instanceof Model model ? model(model) : List.of();
    }

    private static List<PortFact> snapshots(Snapshots snapshots) {
        List<PortFact> out = new ArrayList<>();
        out.add(new PortFact("channels", labels(snapshots.channels())));
        out.add(new PortFact("inputs", labels(snapshots.inputs())));
        out.add(new PortFact("time unit", unit(snapshots.time().unit())));
        out.add(new PortFact("step", snapshots.step().isPresent() ? Double.toString(snapshots.step().getAsDouble()) : "uneven"));
        out.add(new PortFact("delay", delay(snapshots.delay())));
        for (Snapshots.Part part : Snapshots.Part.values()) {
            int samples = snapshots.runs(part).stream().mapToInt(run -> run.samples() - run.leadIn()).sum();
            out.add(new PortFact(part.name().toLowerCase(Locale.ROOT), snapshots.runs(part).size() + " runs, " + samples + " samples"));
        }
        return out;
    }

    private static List<PortFact> operator(FittedOperator operator) {
        List<PortFact> out = new ArrayList<>();
        out.add(new PortFact("method", operator.method()));
        out.add(new PortFact("rank", operator.rank() + " of " + operator.functions().rank()));
        out.add(new PortFact("channels", labels(operator.snapshots().channels())));
        out.add(new PortFact("time unit", unit(operator.snapshots().time().unit())));
        out.add(new PortFact("delay", delay(operator.snapshots().delay())));
        return out;
    }

    private static List<PortFact> spectrum(Spectrum spectrum) {
        return List.of(new PortFact("modes", Integer.toString(spectrum.modes().size())), new PortFact("rank", Integer.toString(spectrum.rank())),
                new PortFact("channels", labels(spectrum.channels())), new PortFact("time unit", unit(spectrum.timeUnit())));
    }

    private static List<PortFact> verdict(Verdict verdict) {
        return List.of(new PortFact("overall", verdict.overall().grade().word()),
                new PortFact("modes that count", Long.toString(verdict.modes().stream().filter(ModeVerdict::counts).count())),
                new PortFact("sentence", verdict.overall().sentence()));
    }

    private static List<PortFact> model(Model model) {
        List<PortFact> out = new ArrayList<>();
        if (!model.name().isEmpty()) {
            out.add(new PortFact("name", model.name()));
        }
        out.addAll(operator(model.operator()));
        out.add(new PortFact("modes", Integer.toString(model.spectrum().modes().size())));
        out.addAll(verdict(model.verdict()));
        out.add(new PortFact("data fingerprint", Fingerprint.of(model.operator().snapshots())));
        return out;
    }

    private static String labels(List<Channel> channels) {
        return channels.isEmpty() ? "none" : channels.size() + ": " + String.join(", ", channels.stream().map(Channel::label).toList());
    }

    private static String unit(String unit) {
        return unit.isEmpty() ? "unknown" : unit;
    }

    private static String delay(DelayEmbedding delay) {
        return delay.depth() == 1 ? "none" : "depth " + delay.depth() + ", spacing " + delay.spacing();
    }
}
