package org.modestead.engine.modelfile;

import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Snapshots;

/** A fitted operator with the snapshots it was fitted to and the estimator, so that checks can fit again. */
public final class StoredOperator {

    private StoredOperator() {}

    /** Returns the tree of an operator. */
    public static Stored.Fields of(FittedOperator operator) {
        return new FieldsWriter().text("method", operator.method()).whole("rank", operator.rank()).text("rank_choice", operator.rankChoice())
                .number("ridge", operator.ridge()).put("kernel", operator.kernel(), StoredKernel::of)
                .put("estimator", StoredEstimator.of(operator.estimator())).put("compression", StoredCompression.of(operator.compression()))
                .put("snapshots", StoredSnapshots.of(operator.snapshots())).list("doubts", operator.doubts(), StoredSnapshots::of).done();
    }

    /** Returns the operator of a tree. */
    public static FittedOperator read(FieldsReader in) {
        Snapshots snapshots = in.object("snapshots", StoredSnapshots::read);
        OrthonormalCompression compression = in.object("compression", own -> StoredCompression.read(own, snapshots.stateSize()));
        return new FittedOperator(compression, in.count("rank", 1, compression.rank()), in.text("rank_choice"), in.number("ridge"),
                in.object("estimator", StoredEstimator::read), in.text("method"), in.optional("kernel", StoredKernel::readSpec), snapshots,
                in.objects("doubts", StoredSnapshots::readDoubt));
    }
}
