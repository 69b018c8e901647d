package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.words.Cautions;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.TimeUnit;
import org.modestead.nodes.words.VerdictWords;

/** Writes a verdict in plain words: what may be said of each mode, what decided it, what may be done, and what always holds. */
public final class VerdictJson {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private VerdictJson() {}

    /** Returns the verdict without the figures of the modes. */
    public static ObjectNode of(Verdict verdict) {
        return of(verdict, Optional.empty());
    }

    /**
     * Returns the whole verdict; of the findings only those that decided, and those on the operator as a whole.
     *
     * @param verdict on the modes
     * @param spectrum that was judged, where it is at hand: each mode is then told with its figures
     */
    public static ObjectNode of(Verdict verdict, Optional<Spectrum> spectrum) {
        ModeVerdict overall = verdict.overall();
        ObjectNode out = NODES.objectNode().put("overall", overall.grade().word())
                .put("headline", Sentence.of(VerdictWords.headline(overall.grade()))).put("meaning", VerdictWords.overall(overall.grade()))
                .put("sentence", Sentence.of(overall.sentence())).put("advice", VerdictWords.advice(overall.grade()))
                .put("driven", verdict.modes().stream().anyMatch(VerdictJson::isUnforeseen) ? VerdictWords.DRIVEN : "");
        ArrayNode modes = out.putArray("modes");
        verdict.modes().forEach(mode -> modes.add(mode(verdict, mode, figures(mode, spectrum))));
        out.set("whole", findings(verdict.findings().stream().filter(finding -> finding.mode() == 0 && !told(finding)).toList()));
        texts(out.putArray("doubts"), verdict.doubts().stream().map(doubt -> Sentence.of(doubt.sentence())).toList());
        texts(out.putArray("safety"), Cautions.STANDING);
        return out;
    }

    /** Absent because it could not be foreseen on data that the fit never saw, as is a mode that something unrecorded drives. */
    private static boolean isUnforeseen(ModeVerdict mode) {
        return mode.counts() && mode.grade() == Grade.ABSENT && mode.decidedBy().contains("holdout-residual");
    }

    /** The verdict itself is told above the findings. */
    private static boolean told(Finding finding) {
        return finding.check().equals("verdict");
    }

    private static String figures(ModeVerdict judged, Optional<Spectrum> spectrum) {
        return spectrum.flatMap(given -> given.modes().stream().filter(mode -> mode.number() == judged.mode()).findFirst()
                .map(mode -> ModeWords.headline(mode, new TimeUnit(given.timeUnit())) + "; " + Digits.percent(mode.energyShare())
                        + " of the signal")).orElse("");
    }

    private static ObjectNode mode(Verdict verdict, ModeVerdict mode, String figures) {
        ObjectNode out = NODES.objectNode().put("mode", mode.mode()).put("selection", "mode:" + mode.mode()).put("figures", figures)
                .put("grade", mode.grade().word()).put("counts", mode.counts()).put("meaning", VerdictWords.meaning(mode.grade()))
                .put("sentence", Sentence.of(mode.sentence())).put("advice", VerdictWords.advice(mode));
        texts(out.putArray("decidedBy"), mode.decidedBy());
        out.set("deciding", findings(verdict.findings().stream()
                .filter(finding -> finding.mode() == mode.mode() && mode.decidedBy().contains(finding.check())).toList()));
        return out;
    }

    private static ArrayNode findings(List<Finding> findings) {
        ArrayNode out = NODES.arrayNode();
        findings.forEach(finding -> {
            ObjectNode one = out.addObject().put("check", finding.check()).put("name", Sentence.capital(finding.check().replace('-', ' ')));
            Numbers.put(one, "value", finding.value());
            Numbers.put(one, "threshold", finding.threshold());
            one.put("outcome", outcome(finding)).put("sentence", Sentence.of(finding.sentence()));
        });
        return out;
    }

    private static String outcome(Finding finding) {
        if (Double.isNaN(finding.threshold())) {
            return "for information";
        }
        return finding.passed() ? "passed" : "failed";
    }

    private static void texts(ArrayNode out, List<String> texts) {
        texts.forEach(out::add);
    }
}
