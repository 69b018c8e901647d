package org.modestead.engine.operator;

import java.util.Optional;
import org.modestead.engine.basis.FunctionBasis;

/** Functions of which those up to one rank are made at once, and all others together when somebody asks for the first of them. */
final class StagedFunctions implements Whitened {

    private final StateFunctions source;
    private final Optional<Stage> first;
    private Optional<OrthonormalCompression> whole = Optional.empty();

    /** What is at hand. */
    private record Stage(StateFunctions.Made made, OrthonormalCompression compression) {}

    /** With none at hand. */
    StagedFunctions(StateFunctions source) {
        this(source, Optional.empty());
    }

    private StagedFunctions(StateFunctions source, Optional<Stage> first) {
        this.source = source;
        this.first = first;
    }

    @Override
    public Whitened at(int r) {
        if (!source.clear(r)) {
            return source.states().whiten(source.largest());
        }
        StateFunctions.Made made = source.leading(r);
        return new StagedFunctions(source, Optional.of(new Stage(made, source.compression(made))));
    }

    @Override
    public OrthonormalCompression leading(int r) {
        return first.isPresent() && r <= first.get().compression().rank() ? first.get().compression().leading(r) : whole().leading(r);
    }

    @Override
    public synchronized OrthonormalCompression whole() {
        if (whole.isEmpty()) {
            whole = Optional.of(first.map(this::completed).orElseGet(() -> source.states().whiten(source.largest())));
        }
        return whole.get();
    }

    private OrthonormalCompression completed(Stage stage) {
        return stage.compression().rank() == source.largest() ? stage.compression() : source.compression(stage.compression(), stage.made(),
                source.beyond(stage.made(), stage.compression().observable()));
    }

    @Override
    public FunctionBasis basis() {
        return source.states().basis();
    }

    @Override
    public double[] singular() {
        return source.singular();
    }

    @Override
    public int snapshots() {
        return source.states().now().length;
    }

    @Override
    public InnerProduct innerProduct() {
        return InnerProduct.DATA;
    }

    @Override
    public Evolution evolution() {
        return new Evolution.StepMap(source.states().step());
    }

    @Override
    public Optional<InputEffect> inputs() {
        return Optional.empty();
    }
}
