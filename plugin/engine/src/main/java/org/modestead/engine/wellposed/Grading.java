package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.spectrum.Mode;

/**
 * From findings to a grade. The order matters: evidence against a mode is taken before the lack of evidence for it.
 *
 * <ol>
 * <li>the space norm grows from rung to rung, the residual stays above its threshold and noise does not explain it, or in the space of a kernel neither rate
 *     nor weight settles and the residual is not close on any rung: absent
 * <li>a cluster of eigenvalues with one eigenfunction, a twin that the runs cannot tell from it, a rate that noise upsets, a likeness whose norm still rises,
 *     rate or weight that keep changing, or, in a mode that is nearly all of the signal, a residual that is not close and another rate in the second half of
 *     the runs than in the first: drifts
 * <li>too few rungs, nothing held out, neither a residual nor settling to be seen in the noise, a residual that noise explains, a fitted rank that does not
 *     show the mode as it is, too small a share captured, or another step disagrees: undecided
 * <li>overlap with other modes, joint and solo weights differ, noise blurs its figures, the residual is not close, or the space does not hold
 *     the signal: settles
 * <li>otherwise: stands
 * </ol>
 *
 * The constant function with rate 0 is an eigenfunction of every flow: it stands but counts as no evidence.
 */
final class Grading {

    /** Square of what is left of a residual over the square that noise explains, up to which it is no evidence against a mode. */
    private static final double BLURRED = 5;

    private Grading() {}

    static ModeVerdict grade(Mode mode, Evidence evidence, List<Finding> findings) {
        if (mode.constant()) {
            return constant(mode);
        }
        boolean counts = evidence.carries(mode);
        for (Grade grade : List.of(Grade.ABSENT, Grade.DRIFTS, Grade.UNDECIDED, Grade.SETTLES)) {
            List<Finding> against = against(grade, mode, evidence, findings);
            if (!against.isEmpty()) {
                return verdict(mode, grade, against, counts);
            }
        }
        List<Finding> deciding = findings.stream().filter(f -> f.mode() == mode.number() && !Double.isNaN(f.threshold())).toList();
        return verdict(mode, Grade.STANDS, deciding, counts);
    }

    static ModeVerdict constant(Mode mode) {
        return new ModeVerdict(mode.number(), Grade.STANDS, List.of(), false,
                "This is the constant function, which every motion leaves alone: true, but no evidence of a mode.");
    }

    private static List<Finding> against(Grade grade, Mode judged, Evidence evidence, List<Finding> findings) {
        List<Finding> out = new ArrayList<>();
        int mode = judged.number();
        switch (grade) {
            case ABSENT -> {
                failed(findings, mode, "space-norm-growth").ifPresent(out::add);
                failed(findings, mode, "holdout-residual").filter(f -> !Double.isNaN(f.value()) && !FittedRank.spoilt(mode, evidence) && !blurred(mode, evidence))
                        .ifPresent(out::add);
                if (out.isEmpty() && evidence.operator().functions().innerProduct() == InnerProduct.SPACE) {
                    out.addAll(restless(findings, mode));
                }
            }
            case DRIFTS -> {
                failed(findings, mode, "clustered-eigenvalues").ifPresent(out::add);
                failed(findings, mode, "resolved-rates").ifPresent(out::add);
                failed(findings, mode, "determined-rate").ifPresent(out::add);
                failed(findings, mode, SignalInSpace.LIKENESS).ifPresent(out::add);
                exceeded(findings, mode, "settling").ifPresent(out::add);
                out.addAll(wandering(findings, judged, evidence));
            }
            case UNDECIDED -> {
                failed(findings, mode, "settling").ifPresent(out::add);
                failed(findings, mode, "holdout-residual").ifPresent(out::add);
                failed(findings, mode, "fitted-rank").ifPresent(out::add);
                failed(findings, 0, "captured-share").ifPresent(out::add);
                failed(findings, mode, "step-consistency").ifPresent(out::add);
                unseen(findings, mode).ifPresent(out::add);
                if (!evidence.heldOut()) {
                    out.add(new Finding(mode, "holdout-residual", Double.NaN, Double.NaN, false,
                            "Nothing was held out, so its residual is no independent evidence: hold out runs or a tail."));
                }
            }
            case SETTLES -> {
                failed(findings, mode, "eigenfunction-overlap").ifPresent(out::add);
                failed(findings, mode, "joint-solo-gap").ifPresent(out::add);
                failed(findings, mode, "noise-sensitivity").ifPresent(out::add);
                failed(findings, mode, "close-residual").ifPresent(out::add);
                failed(findings, 0, "signal-in-space").ifPresent(out::add);
            }
            default -> throw new IllegalArgumentException(grade.word());
        }
        return out;
    }

    /** Neither does the mode settle nor does it keep its own rule of motion closely on any rung: what drifts does keep it. */
    private static List<Finding> restless(List<Finding> findings, int mode) {
        Optional<Finding> unsettled = exceeded(findings, mode, "settling");
        Optional<Finding> missing = exceeded(findings, mode, "close-residual");
        return unsettled.isPresent() && missing.isPresent() ? List.of(unsettled.get(), missing.get()) : List.of();
    }

    /** Neither does a mode that is nearly all of the signal keep its own rule of motion closely nor its rate from one half of the runs to the other. */
    private static List<Finding> wandering(List<Finding> findings, Mode mode, Evidence evidence) {
        Optional<Finding> missing = exceeded(findings, mode.number(), "close-residual").filter(f -> SteadyRate.wanders(mode, evidence));
        return findings.stream().filter(f -> missing.isPresent() && f.mode() == mode.number() && f.check().equals("steady-rate"))
                .flatMap(steady -> Stream.of(steady, missing.get())).toList();
    }

    /** No rung tells how well a mode keeps its rule, and that it settles was not seen either but excused by noise: nothing speaks for it. */
    private static Optional<Finding> unseen(List<Finding> findings, int mode) {
        boolean excused = findings.stream().anyMatch(f -> f.mode() == mode && f.check().equals("settling") && f.passed() && !(f.value() <= f.threshold()));
        return failed(findings, mode, "close-residual").filter(f -> excused && Double.isNaN(f.value()));
    }

    /** Whether noise in the runs judged on explains so much of the residual that what is left may be the error of rates fitted in noise. */
    private static boolean blurred(int mode, Evidence evidence) {
        return evidence.ladderOf(mode).stream().anyMatch(row -> row.rank() == evidence.operator().rank() && row.withinNoise(BLURRED));
    }

    private static Optional<Finding> failed(List<Finding> findings, int mode, String check) {
        return findings.stream().filter(f -> f.mode() == mode && f.check().equals(check) && !f.passed()).findFirst();
    }

    /** A check that failed because its figure was measured and is above its threshold. */
    private static Optional<Finding> exceeded(List<Finding> findings, int mode, String check) {
        return failed(findings, mode, check).filter(f -> f.value() > f.threshold());
    }

    private static ModeVerdict verdict(Mode mode, Grade grade, List<Finding> deciding, boolean counts) {
        List<String> decidedBy = deciding.stream().map(Finding::check).distinct().toList();
        StringBuilder sentence = new StringBuilder("Mode ").append(mode.number()).append(' ').append(grade.word()).append(": ")
                .append(Reservation.advice(grade, decidedBy)).append('.');
        deciding.forEach(finding -> sentence.append(' ').append(finding.sentence()));
        return new ModeVerdict(mode.number(), grade, decidedBy, counts, sentence.toString());
    }

    /** The worst grade among the modes that count; undecided when none does. */
    static ModeVerdict overall(List<ModeVerdict> verdicts) {
        Optional<ModeVerdict> worst = verdicts.stream().filter(ModeVerdict::counts).max(Comparator.comparing(ModeVerdict::grade));
        if (worst.isEmpty()) {
            return new ModeVerdict(0, Grade.UNDECIDED, List.of("captured-share"), true,
                    "No mode carries a stated share of the signal, so there is nothing to decide on: raise the rank or choose another kernel.");
        }
        long counted = verdicts.stream().filter(ModeVerdict::counts).count();
        long same = verdicts.stream().filter(v -> v.counts() && v.grade() == worst.get().grade()).count();
        return new ModeVerdict(0, worst.get().grade(), worst.get().decidedBy(), true, "Overall: " + worst.get().grade().word() + ", "
                + worst.get().grade().advice() + ". Of " + counted + (counted == 1 ? " mode that carries" : " modes that carry")
                + " the signal " + same + (same == 1 ? " has" : " have") + " this grade. " + worst.get().sentence());
    }
}
