package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.RecordingFault;

/**
 * Cuts one run into pieces and samples each.
 *
 * @param plan what to do
 * @param wanted which times
 * @param columnNames channels, then inputs
 * @param wording how times are written
 */
record RunPieces(SnapshotPlan plan, TargetTimes wanted, List<String> columnNames, Wording wording) {

    /**
     * Returns the pieces of a run that hold at least two states, in order, at least one.
     *
     * @param run checked
     * @param cut where its parts end
     * @param log told of gaps, missing cells and samples left out
     * @throws RecordingFault if a gap or a missing cell is refused, or if no piece is long enough
     */
    List<Piece> of(Run run, Cut cut, PreparationLog log) {
        Gaps gaps = Gaps.find(run, plan.gapFactorOrDefault());
        MissingCells missing = MissingCells.find(run);
        refuse(gaps, missing);
        log.recorded(gaps, missing, plan.gapPolicy());
        List<Stretch> stretches = Stretches.of(gaps, plan.gapPolicy() == GapPolicy.SPLIT, missing,
                plan.missing() == MissingPolicy.SPLIT);
        List<Piece> kept = new ArrayList<>();
        long usable = 0;
        long scattered = 0;
        int longest = 0;
        for (int i = 0; i < stretches.size(); i++) {
            StagedRows rows = StagedRows.of(missing, stretches.get(i), cut);
            if (rows.length() == 0) {
                continue;
            }
            String id = stretches.size() == 1 ? run.id() : run.id() + "#" + (i + 1);
            Piece piece = Piece.sample(id, run, rows, gaps, wanted);
            usable += rows.length();
            longest = Math.max(longest, piece.samples());
            if (piece.samples() < plan.samplesNeeded()) {
                scattered += rows.length();
            } else {
                kept.add(piece);
            }
        }
        if (kept.isEmpty()) {
            throw tooShort(run, longest, stretches.size());
        }
        kept.forEach(log::kept);
        log.leftOut(run.id(), run.samples() - usable, "where a column has no number");
        log.leftOut(run.id(), scattered,
                "in pieces with fewer than the " + plan.samplesNeeded() + " samples two states need");
        return kept;
    }

    private void refuse(Gaps gaps, MissingCells missing) {
        if (plan.gapPolicy() == GapPolicy.REFUSE && gaps.count() > 0) {
            throw gaps.refusal(wording);
        }
        if (plan.missing() == MissingPolicy.REFUSE && missing.count() > 0) {
            throw missing.refusal(wording, columnNames);
        }
    }

    private RecordingFault tooShort(Run run, int longest, int stretches) {
        String seen = stretches > 1 ? "the longest of its " + stretches + " pieces has " + Wording.count(longest, "sample")
                : longest == run.samples() ? "it has " + Wording.count(longest, "sample")
                : Wording.count(longest, "sample") + " can be made of its " + run.samples();
        DelayEmbedding delay = plan.delay();
        String need = delay.depth() == 1 ? "two states need " + plan.samplesNeeded()
                : "two states of delay depth " + delay.depth() + " and spacing " + delay.spacing() + " need "
                + plan.samplesNeeded();
        String remedy = (stretches > 1 ? "have gaps and missing cells interpolated or raise the gap factor, " : "")
                + (delay.depth() > 1 ? "choose a smaller delay depth, " : "")
                + (wanted.uniform().isPresent() ? "choose a smaller step, " : "") + "or leave this run out";
        return new RecordingFault("run " + run.id(), seen + ", " + need, remedy.startsWith("or ") ? remedy.substring(3)
                : remedy);
    }
}
