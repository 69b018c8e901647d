package org.modestead.engine.modelfile;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.ImposedStructure;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.InputEffect;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.InputWindow;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.NoiseMoments;
import org.modestead.engine.operator.NoisyStep;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.Structure;

/** An operator in orthonormal functions up to its largest rank R, with what makes every lower rank again. */
final class StoredCompression {

    private static final int MOST_INPUT_COLUMNS = 1 << 20;

    private StoredCompression() {}

    static Stored.Fields of(OrthonormalCompression compression) {
        return new FieldsWriter().put("basis", StoredBasis.of(compression.basis())).matrix("map", compression.map())
                .matrix("action", compression.action()).matrix("second", compression.second()).matrix("observable", compression.observable())
                .vector("singular", compression.singular()).whole("snapshots", compression.snapshots())
                .choice("inner_product", compression.innerProduct()).put("evolution", of(compression.evolution()))
                .put("noisy", compression.noisy(), StoredCompression::of).put("inputs", compression.inputs(), StoredCompression::of)
                .put("imposed", compression.imposed(), imposing ->
                        new FieldsWriter().choice("structure", imposing.structure()).matrix("free", imposing.free()).done()).done();
    }

    /** @param stateSize N of the snapshots of the fit */
    static OrthonormalCompression read(FieldsReader in, int stateSize) {
        double[] singular = in.vector("singular");
        int rank = singular.length;
        if (rank == 0) {
            throw in.wrong("singular", "no number", "at least one");
        }
        Optional<InputEffect> inputs = in.optional("inputs", own -> inputs(own, stateSize, rank));
        int arguments = stateSize + inputs.map(effect -> columns(effect.window())).orElse(0);
        FunctionBasis basis = in.object("basis", own -> StoredBasis.read(own, arguments));
        return new OrthonormalCompression(basis, in.matrix("map", basis.size(), rank), in.matrix("action", rank, rank),
                in.matrix("second", rank, rank), in.matrix("observable", rank, stateSize), singular,
                in.count("snapshots", 1, Integer.MAX_VALUE), in.choice("inner_product", InnerProduct.class),
                in.object("evolution", StoredCompression::evolution), in.optional("noisy", own -> noisy(own, rank)), inputs,
                in.optional("imposed", own -> new ImposedStructure(own.choice("structure", Structure.class), own.matrix("free", rank, rank))));
    }

    private static Stored.Fields of(Evolution evolution) {
        if (evolution instanceof Evolution.StepMap map) {
            return new FieldsWriter().text("kind", "step-map").number("step", map.step()).done();
        }
        return new FieldsWriter().text("kind", "generator").number("contraction", ((Evolution.Generator) evolution).contraction()).done();
    }

    private static Evolution evolution(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "step-map" -> new Evolution.StepMap(positive(in, "step"));
            case "generator" -> new Evolution.Generator(positive(in, "contraction"));
            default -> throw in.wrong("kind", "an evolution of kind " + kind, "step-map or generator");
        };
    }

    private static double positive(FieldsReader in, String name) {
        double value = in.number(name);
        if (!(value > 0) || Double.isInfinite(value)) {
            throw in.wrong(name, "the number " + value, "a positive number");
        }
        return value;
    }

    private static Stored.Fields of(NoisyStep step) {
        return new FieldsWriter().choice("correction", step.correction()).matrix("moved", step.moved())
                .put("moments", step.moments(), moments -> new FieldsWriter().matrix("gram", moments.gram()).matrix("action", moments.action())
                        .matrix("gram_noise", moments.gramNoise()).matrix("action_noise", moments.actionNoise()).done()).done();
    }

    private static NoisyStep noisy(FieldsReader in, int rank) {
        DMatrixRMaj moved = in.matrix("moved");
        if (moved.numCols != rank || moved.numRows < rank) {
            throw in.wrong("moved", "a matrix of " + moved.numRows + " x " + moved.numCols, "one of at least " + rank + " x " + rank);
        }
        return new NoisyStep(in.choice("correction", NoiseCorrection.class), moved, in.optional("moments", own ->
                new NoiseMoments(own.matrix("gram", rank, rank), own.matrix("action", rank, rank), own.matrix("gram_noise", rank, rank),
                        own.matrix("action_noise", rank, rank))));
    }

    private static Stored.Fields of(InputEffect effect) {
        InputWindow window = effect.window();
        return new FieldsWriter().choice("use", window.use()).whole("count", window.inputs()).whole("reach", window.reach())
                .whole("stride", window.stride()).vector("rest", window.rest()).put("terms", StoredBasis.of(effect.terms()))
                .matrix("map", effect.map()).matrix("now", effect.now()).matrix("next", effect.next())
                .matrix("observed_now", effect.observedNow()).matrix("observed_next", effect.observedNext()).done();
    }

    private static InputEffect inputs(FieldsReader in, int stateSize, int rank) {
        int count = in.count("count", 1, MOST_INPUT_COLUMNS);
        InputWindow window = new InputWindow(in.choice("use", InputUse.class), count, in.count("reach", 0, MOST_INPUT_COLUMNS),
                in.count("stride", 1, MOST_INPUT_COLUMNS), in.vector("rest", count));
        FunctionBasis terms = in.object("terms", own -> StoredBasis.read(own, Math.addExact(stateSize, columns(window))));
        DMatrixRMaj map = in.matrix("map");
        int independent = map.numCols;
        return new InputEffect(window, terms, in.matrix("map", terms.size(), independent), in.matrix("now", independent, rank),
                in.matrix("next", independent, rank), in.matrix("observed_now", independent, stateSize),
                in.matrix("observed_next", independent, stateSize));
    }

    /** Columns that the window adds to a state. */
    private static int columns(InputWindow window) {
        long columns = (long) window.inputs() * (window.reach() + (long) window.stride() + (window.use() == InputUse.STRAIGHT ? 1 : 0));
        if (columns > MOST_INPUT_COLUMNS) {
            throw new IllegalArgumentException(columns + " columns of inputs");
        }
        return (int) columns;
    }
}
