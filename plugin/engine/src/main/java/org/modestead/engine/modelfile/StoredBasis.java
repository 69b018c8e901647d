package org.modestead.engine.modelfile;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.basis.Harmonics;
import org.modestead.engine.basis.InputTerms;
import org.modestead.engine.basis.JoinedFunctions;
import org.modestead.engine.basis.KernelSections;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.basis.MonomialFunctions;
import org.modestead.engine.basis.OccupationFunctions;
import org.modestead.engine.basis.RandomFourierFunctions;
import org.modestead.engine.basis.ScaledFunctions;

/** Functions of a state, by kind, with all they need to be evaluated anywhere. */
final class StoredBasis {

    private StoredBasis() {}

    static Stored.Fields of(FunctionBasis basis) {
        FieldsWriter out = new FieldsWriter();
        if (basis instanceof Coordinates coordinates) {
            return out.text("kind", "coordinates").whole("size", coordinates.size()).done();
        }
        if (basis instanceof MonomialFunctions monomials) {
            return of(out, monomials);
        }
        if (basis instanceof Harmonics harmonics) {
            return out.text("kind", "harmonics").whole("order", harmonics.order()).vector("periods", harmonics.periods())
                    .whole("state_size", harmonics.stateSize()).text("description", harmonics.description()).done();
        }
        if (basis instanceof KernelSections sections) {
            return out.text("kind", "kernel-sections").put("kernel", StoredKernel.of(sections.kernel())).matrix("centres", sections.centres())
                    .done();
        }
        if (basis instanceof LandmarkFeatures features) {
            return out.text("kind", "landmarks").put("kernel", StoredKernel.of(features.kernel())).matrix("landmarks", features.landmarks())
                    .matrix("inverse_transposed", features.inverseTransposed()).done();
        }
        if (basis instanceof RandomFourierFunctions waves) {
            return out.text("kind", "random-waves").matrix("frequencies", waves.frequencies()).text("description", waves.description()).done();
        }
        if (basis instanceof OccupationFunctions occupation) {
            return of(out, occupation);
        }
        if (basis instanceof ScaledFunctions scaled) {
            return out.text("kind", "scaled").put("functions", of(scaled.functions())).vector("factors", scaled.factors()).done();
        }
        if (basis instanceof JoinedFunctions joined) {
            return out.text("kind", "joined").whole("state_size", joined.stateSize()).put("of_state", of(joined.ofState()))
                    .put("of_both", of(joined.ofBoth())).done();
        }
        if (basis instanceof InputTerms terms) {
            return out.text("kind", "input-terms").whole("state_size", terms.stateSize()).whole("inputs", terms.inputs())
                    .put("factors", terms.factors(), StoredBasis::of).done();
        }
        throw new ModelFileFault("model file", "functions of another extension (" + basis.describe() + ") are of a kind that it has no form for",
                "use functions that come with Modestead");
    }

    /** @param arguments number of state components, with the inputs where the functions read them */
    static FunctionBasis read(FieldsReader in, int arguments) {
        String kind = in.text("kind");
        return switch (kind) {
            case "coordinates" -> new Coordinates(in.count("size", arguments, arguments));
            case "monomials" -> monomials(in, arguments);
            case "harmonics" -> harmonics(in, arguments);
            case "kernel-sections" -> new KernelSections(in.object("kernel", StoredKernel::read), columns(in, "centres", arguments));
            case "landmarks" -> landmarks(in, arguments);
            case "random-waves" -> new RandomFourierFunctions(columns(in, "frequencies", arguments), in.text("description"));
            case "occupation" -> new OccupationFunctions(in.object("kernel", StoredKernel::read), segments(in, arguments));
            case "scaled" -> scaled(in, arguments);
            case "joined" -> joined(in, arguments);
            case "input-terms" -> inputTerms(in, arguments);
            default -> throw in.wrong("kind", "functions of kind " + kind, "a kind that is known here");
        };
    }

    private static Stored.Fields of(FieldsWriter out, MonomialFunctions monomials) {
        int variables = monomials.exponents().get(0).length;
        long[] flat = monomials.exponents().stream().flatMapToInt(Arrays::stream).asLongStream().toArray();
        return out.text("kind", "monomials").put("exponents", new Stored.Wholes(variables, flat)).text("description", monomials.description())
                .done();
    }

    private static FunctionBasis monomials(FieldsReader in, int arguments) {
        Stored.Wholes found = in.wholeMatrix("exponents");
        if (found.columns() != arguments || found.values().length == 0) {
            throw in.wrong("exponents", found.values().length + " exponents in rows of " + found.columns(), "rows of " + arguments);
        }
        if (Arrays.stream(found.values()).anyMatch(power -> power < 0 || power > Short.MAX_VALUE)) {
            throw in.wrong("exponents", "an exponent that is negative or huge", "a whole number of at least 0");
        }
        List<int[]> exponents = IntStream.range(0, found.values().length / arguments).mapToObj(i ->
                Arrays.stream(found.values(), i * arguments, (i + 1) * arguments).mapToInt(power -> (int) power).toArray()).toList();
        return new MonomialFunctions(exponents, in.text("description"));
    }

    private static FunctionBasis harmonics(FieldsReader in, int arguments) {
        double[] periods = in.vector("periods");
        if (periods.length != 1 && periods.length != arguments) {
            throw in.wrong("periods", periods.length + " periods", "1 or " + arguments);
        }
        return new Harmonics(in.count("order", 1, Short.MAX_VALUE), periods, in.count("state_size", arguments, arguments),
                in.text("description"));
    }

    private static FunctionBasis landmarks(FieldsReader in, int arguments) {
        DMatrixRMaj landmarks = columns(in, "landmarks", arguments);
        return new LandmarkFeatures(in.object("kernel", StoredKernel::read), landmarks,
                in.matrix("inverse_transposed", landmarks.numRows, landmarks.numRows));
    }

    private static FunctionBasis scaled(FieldsReader in, int arguments) {
        FunctionBasis functions = in.object("functions", own -> read(own, arguments));
        return new ScaledFunctions(functions, in.vector("factors", functions.size()));
    }

    private static FunctionBasis joined(FieldsReader in, int arguments) {
        int stateSize = in.count("state_size", 1, arguments);
        return new JoinedFunctions(stateSize, in.object("of_state", own -> read(own, stateSize)), in.object("of_both", own -> read(own, arguments)));
    }

    private static FunctionBasis inputTerms(FieldsReader in, int arguments) {
        int stateSize = in.count("state_size", 1, arguments);
        Optional<FunctionBasis> factors = in.optional("factors", own -> read(own, stateSize));
        return new InputTerms(stateSize, in.count("inputs", arguments - stateSize, arguments - stateSize), factors);
    }

    private static Stored.Fields of(FieldsWriter out, OccupationFunctions occupation) {
        List<OccupationFunctions.Segment> segments = occupation.segments();
        int n = segments.get(0).start().length;
        return out.text("kind", "occupation").put("kernel", StoredKernel.of(occupation.kernel()))
                .vectors("times", segments.stream().map(OccupationFunctions.Segment::times).toList())
                .matrices("states", n, segments.stream().map(OccupationFunctions.Segment::states).toList())
                .vectors("weights", segments.stream().map(OccupationFunctions.Segment::weights).toList())
                .matrix("starts", rows(segments.stream().map(OccupationFunctions.Segment::start).toList()))
                .matrix("ends", rows(segments.stream().map(OccupationFunctions.Segment::end).toList()))
                .vector("run_weights", segments.stream().mapToDouble(OccupationFunctions.Segment::runWeight).toArray()).done();
    }

    private static DMatrixRMaj rows(List<double[]> rows) {
        return new DMatrixRMaj(rows.toArray(double[][]::new));
    }

    private static double[] row(DMatrixRMaj a, int i) {
        return Arrays.copyOfRange(a.data, i * a.numCols, (i + 1) * a.numCols);
    }

    private static List<OccupationFunctions.Segment> segments(FieldsReader in, int arguments) {
        List<double[]> times = in.vectors("times");
        List<DMatrixRMaj> states = in.matrices("states");
        List<double[]> weights = in.vectors("weights");
        int count = times.size();
        if (count == 0 || states.size() != count || weights.size() != count) {
            throw in.wrong("states", states.size() + " segments of states, " + weights.size() + " of weights", count + " of each");
        }
        for (int i = 0; i < count; i++) {
            int samples = times.get(i).length;
            if (weights.get(i).length != samples || states.get(i).numRows != samples || states.get(i).numCols != arguments) {
                throw in.wrong("states", "segment " + i + " of another shape",
                        samples + " states of " + arguments + " components with as many weights");
            }
        }
        DMatrixRMaj starts = in.matrix("starts", count, arguments);
        DMatrixRMaj ends = in.matrix("ends", count, arguments);
        double[] runWeights = in.vector("run_weights", count);
        return IntStream.range(0, count).mapToObj(i -> new OccupationFunctions.Segment(times.get(i), states.get(i), weights.get(i),
                row(starts, i), row(ends, i), runWeights[i])).toList();
    }

    private static DMatrixRMaj columns(FieldsReader in, String name, int columns) {
        DMatrixRMaj found = in.matrix(name);
        if (found.numCols != columns || found.numRows == 0) {
            throw in.wrong(name, "a matrix of " + found.numRows + " x " + found.numCols, "one with " + columns + " columns");
        }
        return found;
    }
}
