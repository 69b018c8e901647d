package org.modestead.engine.modelfile;

import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.basis.FourierDictionary;
import org.modestead.engine.basis.MonomialDictionary;
import org.modestead.engine.basis.RandomFourierDictionary;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.ExtrapolatedEstimator;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.operator.Structure;
import org.modestead.engine.operator.StructuredEstimator;

/** An estimator: what a fit is repeated with by the ladder, the bootstrap and the other step. */
final class StoredEstimator {

    private static final int LONGEST_STRIDE = 1 << 24;

    private StoredEstimator() {}

    static Stored.Fields of(Estimator estimator) {
        FieldsWriter out = new FieldsWriter();
        if (estimator instanceof LinearEstimator linear) {
            return out.text("kind", "linear").whole("stride", linear.stride()).choice("correction", linear.correction())
                    .choice("inputs", linear.inputs()).done();
        }
        if (estimator instanceof DictionaryEstimator explicit) {
            return out.text("kind", "dictionary").put("dictionary", of(explicit.dictionary())).whole("stride", explicit.stride())
                    .choice("inputs", explicit.inputs()).done();
        }
        if (estimator instanceof KernelStepEstimator step) {
            return out.text("kind", "kernel-step").put("kernel", StoredKernel.of(step.space())).whole("landmarks", step.landmarks())
                    .whole("stride", step.stride()).done();
        }
        if (estimator instanceof OccupationEstimator generator) {
            return out.text("kind", "generator").put("kernel", StoredKernel.of(generator.space()))
                    .whole("segment_samples", generator.plan().samples()).whole("end_smoothing", generator.plan().endSmoothing())
                    .number("contraction", generator.contraction()).done();
        }
        if (estimator instanceof StructuredEstimator structured) {
            return out.text("kind", "structured").choice("structure", structured.structure()).put("free", of(structured.free())).done();
        }
        if (estimator instanceof ExtrapolatedEstimator extrapolated) {
            return out.text("kind", "extrapolated").put("plain", of(extrapolated.plain())).done();
        }
        throw unknown("an estimator of another extension (" + estimator.id() + ")");
    }

    static Estimator read(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "linear" -> new LinearEstimator(stride(in), in.choice("correction", NoiseCorrection.class), in.choice("inputs", InputUse.class));
            case "dictionary" -> new DictionaryEstimator(in.object("dictionary", StoredEstimator::dictionary), stride(in),
                    in.choice("inputs", InputUse.class));
            case "kernel-step" -> new KernelStepEstimator(in.object("kernel", StoredKernel::read), in.count("landmarks", 1, Integer.MAX_VALUE),
                    stride(in));
            case "generator" -> new OccupationEstimator(in.object("kernel", StoredKernel::read),
                    new SegmentPlan(in.count("segment_samples", 0, Integer.MAX_VALUE), in.count("end_smoothing", 0, Integer.MAX_VALUE)),
                    in.number("contraction"));
            case "structured" -> new StructuredEstimator(in.object("free", StoredEstimator::read), in.choice("structure", Structure.class));
            case "extrapolated" -> new ExtrapolatedEstimator(in.object("plain", StoredEstimator::read));
            default -> throw in.wrong("kind", "an estimator of kind " + kind, "a kind that is known here");
        };
    }

    private static int stride(FieldsReader in) {
        return in.count("stride", 1, LONGEST_STRIDE);
    }

    private static Stored.Fields of(Dictionary dictionary) {
        FieldsWriter out = new FieldsWriter();
        if (dictionary instanceof MonomialDictionary monomials) {
            return out.text("kind", "monomials").whole("degree", monomials.degree()).done();
        }
        if (dictionary instanceof FourierDictionary fourier) {
            return out.text("kind", "fourier").whole("order", fourier.order()).vector("periods", fourier.periods()).done();
        }
        if (dictionary instanceof RandomFourierDictionary waves) {
            return out.text("kind", "random-waves").put("kernel", StoredKernel.of(waves.kernel())).whole("waves", waves.waves())
                    .whole("seed", waves.seed()).done();
        }
        throw unknown("a dictionary of another extension (" + dictionary.describe() + ")");
    }

    private static Dictionary dictionary(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "monomials" -> new MonomialDictionary(in.count("degree", 1, Short.MAX_VALUE));
            case "random-waves" -> new RandomFourierDictionary(in.object("kernel", StoredKernel::readSpec), in.count("waves", 1, Integer.MAX_VALUE),
                    in.whole("seed"));
            case "fourier" -> new FourierDictionary(in.count("order", 1, Short.MAX_VALUE), in.vector("periods"));
            default -> throw in.wrong("kind", "a dictionary of kind " + kind, "a kind that is known here");
        };
    }

    private static ModelFileFault unknown(String what) {
        return new ModelFileFault("model file", what + " is of a kind that it has no form for", "use one that comes with Modestead");
    }
}
