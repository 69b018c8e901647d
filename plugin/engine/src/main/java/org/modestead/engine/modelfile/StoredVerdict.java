package org.modestead.engine.modelfile;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.function.ToLongFunction;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.LadderRow;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.NoiseEffect;
import org.modestead.engine.wellposed.Verdict;

/** A verdict with its evidence; the rows of the ladder stand column by column. */
public final class StoredVerdict {

    private StoredVerdict() {}

    /** Returns the tree of a verdict. */
    public static Stored.Fields of(Verdict verdict) {
        return new FieldsWriter().put("overall", of(verdict.overall())).list("modes", verdict.modes(), StoredVerdict::of)
                .list("findings", verdict.findings(), StoredVerdict::of).put("ladder", ladder(verdict.ladder()))
                .list("doubts", verdict.doubts(), StoredSnapshots::of).done();
    }

    /** Returns the verdict of a tree. */
    public static Verdict read(FieldsReader in) {
        return new Verdict(in.object("overall", StoredVerdict::mode), in.objects("modes", StoredVerdict::mode),
                in.objects("findings", StoredVerdict::finding), in.object("ladder", StoredVerdict::readLadder),
                in.objects("doubts", StoredSnapshots::readDoubt));
    }

    private static Stored.Fields of(ModeVerdict verdict) {
        return new FieldsWriter().whole("mode", verdict.mode()).choice("grade", verdict.grade()).texts("decided_by", verdict.decidedBy())
                .flag("counts", verdict.counts()).text("sentence", verdict.sentence()).done();
    }

    private static ModeVerdict mode(FieldsReader in) {
        return new ModeVerdict(in.count("mode", 0, Integer.MAX_VALUE), in.choice("grade", Grade.class), in.texts("decided_by"),
                in.flag("counts"), in.text("sentence"));
    }

    private static Stored.Fields of(Finding finding) {
        return new FieldsWriter().whole("mode", finding.mode()).text("check", finding.check()).number("value", finding.value())
                .number("threshold", finding.threshold()).flag("passed", finding.passed()).text("sentence", finding.sentence()).done();
    }

    private static Finding finding(FieldsReader in) {
        return new Finding(in.count("mode", 0, Integer.MAX_VALUE), in.text("check"), in.number("value"), in.number("threshold"),
                in.flag("passed"), in.text("sentence"));
    }

    private static Stored.Fields ladder(List<LadderRow> rows) {
        return new FieldsWriter().put("rank", wholes(rows, LadderRow::rank)).put("mode", wholes(rows, LadderRow::mode))
                .complexVector("rate", rows.stream().map(LadderRow::rate).toList())
                .vector("weight", column(rows, LadderRow::weight)).vector("weight_norm", column(rows, LadderRow::weightNorm))
                .vector("norm_ratio", column(rows, LadderRow::normRatio)).vector("residual", column(rows, LadderRow::residual))
                .vector("raw_residual", column(rows, LadderRow::rawResidual)).vector("gap", column(rows, LadderRow::gap))
                .vector("overlap", column(rows, LadderRow::overlap))
                .vector("noise_rate", column(rows, row -> row.noise().rate())).vector("noise_weight", column(rows, row -> row.noise().weight()))
                .vector("noise_norm", column(rows, row -> row.noise().norm())).done();
    }

    private static List<LadderRow> readLadder(FieldsReader in) {
        List<Complex> rates = in.complexVector("rate");
        int count = rates.size();
        long[] ranks = in.wholeVector("rank", count);
        long[] modes = in.wholeVector("mode", count);
        double[] weight = in.vector("weight", count);
        double[] weightNorm = in.vector("weight_norm", count);
        double[] normRatio = in.vector("norm_ratio", count);
        double[] residual = in.vector("residual", count);
        double[] rawResidual = in.vector("raw_residual", count);
        double[] gap = in.vector("gap", count);
        double[] overlap = in.vector("overlap", count);
        double[] noiseRate = in.vector("noise_rate", count);
        double[] noiseWeight = in.vector("noise_weight", count);
        double[] noiseNorm = in.vector("noise_norm", count);
        List<LadderRow> out = new ArrayList<>(count);
        for (int i = 0; i < count; i++) {
            if (ranks[i] < 1 || ranks[i] > Integer.MAX_VALUE || modes[i] < 0 || modes[i] > Integer.MAX_VALUE) {
                throw in.wrong("rank", "row " + i + " with rank " + ranks[i] + " and mode " + modes[i],
                        "a rank of at least 1 and a mode of at least 0");
            }
            out.add(new LadderRow((int) ranks[i], (int) modes[i], rates.get(i), weight[i], weightNorm[i], normRatio[i], residual[i],
                    rawResidual[i], gap[i], overlap[i], new NoiseEffect(noiseRate[i], noiseWeight[i], noiseNorm[i])));
        }
        return out;
    }

    private static Stored.Wholes wholes(List<LadderRow> rows, ToLongFunction<LadderRow> figure) {
        return new Stored.Wholes(1, rows.stream().mapToLong(figure).toArray());
    }

    private static double[] column(List<LadderRow> rows, ToDoubleFunction<LadderRow> figure) {
        return rows.stream().mapToDouble(figure).toArray();
    }
}
