package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.choose.KernelVerdict;
import org.modestead.engine.choose.RankedKernel;
import org.modestead.engine.spectrum.Mode;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.TimeUnit;
import org.modestead.nodes.words.VerdictWords;

/**
 * A ranking told in sentences.
 *
 * @param rows best first; the first could be fitted
 * @param steps sampling steps ahead
 * @param unit of time
 */
record RankingWords(List<RankedKernel> rows, int steps, TimeUnit unit) {

    private RankedKernel best() {
        return rows.get(0);
    }

    List<String> summary() {
        String ahead = steps == 1 ? "one step ahead" : steps + " steps ahead";
        String name = best().kernel().label();
        List<String> sentences = new ArrayList<>();
        sentences.add(best().verdict().map(verdict -> "Of " + rows.size() + " kernels, " + name + " comes first: judged on training"
                + " samples that were left out, " + VerdictWords.headline(verdict.grade()) + ", and it predicts them " + ahead + " with an"
                + " error of " + errors() + ".").orElseGet(() -> "Of " + rows.size() + " kernels, " + name + " predicts best " + ahead
                + " on training samples that were left out: " + errors() + "."));
        smallestError().ifPresent(other -> sentences.add("The smallest error, " + Digits.figure(other.heldOutError()) + ", has "
                + other.kernel().label() + other.verdict().map(verdict -> ", but there " + VerdictWords.headline(verdict.grade()))
                .orElse("") + "."));
        return sentences;
    }

    private String errors() {
        return Digits.figure(best().heldOutError()) + " of the spread against " + Digits.figure(best().persistenceError())
                + " of persistence";
    }

    /** Another kernel that predicts better but was put behind by its verdict. */
    private Optional<RankedKernel> smallestError() {
        return rows.stream().filter(row -> row.heldOutError() < best().heldOutError()
                && !row.verdict().map(KernelVerdict::grade).equals(best().verdict().map(KernelVerdict::grade)))
                .min((a, b) -> Double.compare(a.heldOutError(), b.heldOutError()));
    }

    List<Doubt> doubts() {
        List<Doubt> doubts = new ArrayList<>();
        if (best().heldOutError() >= best().persistenceError()) {
            doubts.add(new Doubt("kernel-no-better-than-persistence", "The best kernel, " + best().kernel().label()
                    + ", predicts no better than persistence does: " + errors() + "."));
        }
        best().verdict().filter(verdict -> !best().room().holds(verdict.changes())).flatMap(KernelVerdict::strongest)
                .ifPresent(mode -> doubts.add(noRoom(mode)));
        return doubts;
    }

    private Doubt noRoom(Mode mode) {
        boolean changes = best().verdict().map(KernelVerdict::changes).orElse(false);
        boolean nowhere = rows.stream().filter(RankedKernel::fitted).noneMatch(row -> row.room().holds(changes));
        String where = nowhere ? "None of the spaces compared has room for it" : "The space of " + best().kernel().label()
                + " has no room for it";
        return new Doubt("no-room-for-the-mode", "The strongest mode found (" + ModeWords.headline(mode, unit) + ", "
                + ModeWords.change(mode, unit) + "): " + where + ", for it holds " + best().room().statement()
                + ". What was fitted imitates the mode on the sampled region; forecasts through it may be good.");
    }
}
