package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.words.Cautions;
import org.modestead.nodes.words.Sentence;
import org.modestead.nodes.words.VerdictWords;

/** Writes a verdict in plain words: what may be said of each mode, what decided it, what may be done, and what always holds. */
public final class VerdictJson {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private VerdictJson() {}

    /** Returns the whole verdict; of the findings only those that decided, and those on the operator as a whole. */
    public static ObjectNode of(Verdict verdict) {
        ModeVerdict overall = verdict.overall();
        ObjectNode out = NODES.objectNode().put("overall", overall.grade().word())
                .put("headline", Sentence.of(VerdictWords.headline(overall.grade()))).put("meaning", VerdictWords.overall(overall.grade()))
                .put("sentence", Sentence.of(overall.sentence())).put("advice", VerdictWords.advice(overall.grade()));
        ArrayNode modes = out.putArray("modes");
        verdict.modes().forEach(mode -> modes.add(mode(verdict, mode)));
        out.set("whole", findings(verdict.findings().stream().filter(finding -> finding.mode() == 0 && !told(finding)).toList()));
        texts(out.putArray("doubts"), verdict.doubts().stream().map(doubt -> Sentence.of(doubt.sentence())).toList());
        texts(out.putArray("safety"), Cautions.STANDING);
        return out;
    }

    /** The verdict itself is told above the findings. */
    private static boolean told(Finding finding) {
        return finding.check().equals("verdict");
    }

    private static ObjectNode mode(Verdict verdict, ModeVerdict mode) {
        ObjectNode out = NODES.objectNode().put("mode", mode.mode()).put("selection", "mode:" + mode.mode())
                .put("grade", mode.grade().word()).put("counts", mode.counts()).put("meaning", VerdictWords.meaning(mode.grade()))
                .put("sentence", Sentence.of(mode.sentence())).put("advice", VerdictWords.advice(mode.grade()));
        texts(out.putArray("decidedBy"), mode.decidedBy());
        out.set("deciding", findings(verdict.findings().stream()
                .filter(finding -> finding.mode() == mode.mode() && mode.decidedBy().contains(finding.check())).toList()));
        return out;
    }

    private static ArrayNode findings(List<Finding> findings) {
        ArrayNode out = NODES.arrayNode();
        findings.forEach(finding -> {
            ObjectNode one = out.addObject().put("check", finding.check()).put("name", Sentence.capital(finding.check().replace('-', ' ')));
            number(one, "value", finding.value());
            number(one, "threshold", finding.threshold());
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

    private static void number(ObjectNode out, String name, double value) {
        if (Double.isFinite(value)) {
            out.put(name, value);
        } else {
            out.putNull(name);
        }
    }

    private static void texts(ArrayNode out, List<String> texts) {
        texts.forEach(out::add);
    }
}
