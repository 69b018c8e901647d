package org.modestead.engine.choose;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;

/**
 * Whether modes exist in the space of one kernel, judged on training runs alone: fitted to three quarters of them, judged on the rest.
 *
 * @param grade of the worst mode that carries a stated share of the signal
 * @param capturedShare share of the signal's variance on the judging part that the eigenfunctions hold
 * @param residual largest residual on the judging part among the modes that carry the signal; NaN where none was measured
 * @param settling largest change over the last rungs of the ladder among them; NaN where none was measured
 * @param strongest the mode, not the constant, that carries most of the signal
 * @param changes whether that mode grows or decays by more than a tenth over the longest run
 * @param sentence the overall verdict in plain words
 */
public record KernelVerdict(Grade grade, double capturedShare, double residual, double settling, Optional<Mode> strongest, boolean changes,
        String sentence) {

    private static final double CHANGES = 0.1;

    static KernelVerdict of(Spectrum spectrum, Verdict verdict, double longest) {
        List<Integer> counting = verdict.modes().stream().filter(ModeVerdict::counts).map(ModeVerdict::mode).toList();
        Optional<Mode> strongest = spectrum.modes().stream().filter(mode -> !mode.constant())
                .min(Comparator.comparingInt(Mode::number));
        return new KernelVerdict(verdict.overall().grade(), largest(verdict, List.of(0), "captured-share"),
                largest(verdict, counting, "holdout-residual"), largest(verdict, counting, "settling"), strongest,
                strongest.filter(mode -> Math.abs(mode.rate().re()) * longest > CHANGES).isPresent(), verdict.overall().sentence());
    }

    private static double largest(Verdict verdict, List<Integer> modes, String check) {
        return verdict.findings().stream().filter(finding -> modes.contains(finding.mode()) && finding.check().equals(check))
                .mapToDouble(Finding::value).filter(value -> !Double.isNaN(value)).max().orElse(Double.NaN);
    }
}
