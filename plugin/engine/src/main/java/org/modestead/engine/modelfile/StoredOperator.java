package org.modestead.engine.modelfile;

import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Snapshots;

/** A fitted operator with the snapshots it was fitted to and the estimator, so that checks can fit again. */
public final class StoredOperator {

    private StoredOperator() {}

    /** Returns the tree of an operator. */
    public static Stored.Fields of(FittedOperator operator) {
        return new FieldsWriter().text("method", operator.method()).whole("rank", operator.rank()).put("rank_rule", StoredRankRule.of(operator.rule())).text("rank_choice", operator.rankChoice())
                .number("ridge", operator.ridge()).put("kernel", operator.kernel(), StoredKernel::of)
                .put("estimator", StoredEstimator.of(operator.estimator())).put("compression", StoredCompression.of(operator.compression()))
                .put("snapshots", StoredSnapshots.of(operator.snapshots())).list("doubts", operator.doubts(), StoredSnapshots::of).done();
    }

    /** Returns the operator of a tree. */
    public static FittedOperator read(FieldsReader in) {
        Snapshots snapshots = in.object("snapshots", StoredSnapshots::read);
        OrthonormalCompression compression = in.object("compression", own -> StoredCompression.read(own, snapshots.stateSize()));
        int rank = in.count("rank", 1, compression.rank());
        RankRule rule = in.optional("rank_rule", StoredRankRule::read).orElse(new RankRule.Fixed(rank));
        return new FittedOperator(compression, rank, rule, in.text("rank_choice"), in.number("ridge"),
                in.object("estimator", StoredEstimator::read), in.text("method"), in.optional("kernel", StoredKernel::readSpec), snapshots,
                in.objects("doubts", StoredSnapshots::readDoubt));
    }
}
