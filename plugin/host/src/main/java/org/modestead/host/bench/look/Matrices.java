package org.modestead.host.bench.look;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.basis.KernelSections;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/** The matrices that a value holds, as maps of colours. */
public final class Matrices {
    private static final int MOST_FUNCTIONS = 512;
    private static final String GRAM = "gram";
    private static final String GRAM_TITLE = "Gram matrix of the kernel sections";
    private static final String OVERLAP = "overlap";
    private static final String OVERLAP_TITLE = "Overlap of the eigenfunctions";

    private Matrices() {}

    /**
     * Returns the matrices worth a look.
     *
     * @param value what a port carries
     * @return of an operator the compressed operator and the Gram matrix of kernel sections; of a spectrum the overlap of its
     *     eigenfunctions and the weights of its modes; of a model all of them; nothing of other values
     */
    public static List<HeatMap.Offer> of(Object value) {
        if (value instanceof FittedOperator operator) {
            return operator(operator);
        }
        if (value instanceof Spectrum spectrum) {
            return spectrum(spectrum);
        }
        return value instanceof Model model ? Stream.concat(operator(model.operator()).stream(), spectrum(model.spectrum()).stream()).toList()
                : List.of();
    }

    private static List<HeatMap.Offer> operator(FittedOperator operator) {
        List<HeatMap.Offer> out = new ArrayList<>();
        OrthonormalCompression chosen = operator.chosen();
        out.add(new HeatMap("compressed-operator", "Compressed operator at rank " + operator.rank(), "How the operator carries the"
                + " orthonormal functions into each other: the column says which function, the row what of it is found in which function."
                + " A map that is its own mirror image about the diagonal belongs to a self-adjoint operator, whose eigenfunctions are"
                + " orthogonal.", HeatMap.Side.numbered("function"), HeatMap.Side.numbered("function"), true, chosen.action()).offer());
        if (operator.functions().rank() > operator.rank()) {
            out.add(new HeatMap("whole-operator", "Compressed operator up to rank " + operator.functions().rank(), "The same up to the"
                    + " largest rank that the data support. The block of the first " + operator.rank() + " rows and columns belongs to the"
                    + " chosen rank; the ladder climbs from block to block.", HeatMap.Side.numbered("function"),
                    HeatMap.Side.numbered("function"), true, operator.compression().action()).offer());
        }
        gram(operator.functions().basis()).ifPresent(out::add);
        return out;
    }

    /** The kernel at all pairs of centres, which is their Gram matrix in the space. */
    private static Optional<HeatMap.Offer> gram(FunctionBasis basis) {
        if (basis instanceof KernelSections sections) {
            return Optional.of(gram(sections.kernel(), sections.centres(), "centre"));
        }
        return basis instanceof LandmarkFeatures features ? Optional.of(gram(features.kernel(), features.landmarks(), "landmark"))
                : Optional.empty();
    }

    private static HeatMap.Offer gram(Kernel kernel, DMatrixRMaj centres, String title) {
        int every = Math.max(1, (centres.numRows + MOST_FUNCTIONS - 1) / MOST_FUNCTIONS);
        int shown = (centres.numRows + every - 1) / every;
        return new HeatMap.Offer(GRAM, GRAM_TITLE, shown, shown, () -> gram(kernel, centres, title, every));
    }

    private static HeatMap gram(Kernel kernel, DMatrixRMaj centres, String title, int every) {
        DMatrixRMaj some = rows(centres, every);
        String left = every == 1 ? "" : " Every " + every + "th of " + centres.numRows + " is shown.";
        DMatrixRMaj values = kernel.matrix(some, some);
        return new HeatMap(GRAM, GRAM_TITLE, "The kernel " + kernel.spec().label() + " at all pairs of "
                + title + "s: how alike two sections are in the space. A map of one level says that the sections can hardly be told apart;"
                + " a bright diagonal alone, that none knows of another." + left, HeatMap.Side.numbered(title),
                HeatMap.Side.numbered(title), CommonOps_DDRM.elementMin(values) < 0, values);
    }

    private static DMatrixRMaj rows(DMatrixRMaj all, int every) {
        DMatrixRMaj out = new DMatrixRMaj((all.numRows + every - 1) / every, all.numCols);
        for (int i = 0; i < out.numRows; i++) {
            System.arraycopy(all.data, i * every * all.numCols, out.data, i * all.numCols, all.numCols);
        }
        return out;
    }

    private static List<HeatMap.Offer> spectrum(Spectrum spectrum) {
        List<Integer> order = spectrum.modes().stream().flatMap(mode -> mode.indices().stream()).toList();
        List<Mode> modes = spectrum.modes().stream().filter(mode -> !mode.weights().isEmpty()).toList();
        List<HeatMap.Offer> out = new ArrayList<>();
        if (!order.isEmpty()) {
            out.add(new HeatMap.Offer(OVERLAP, OVERLAP_TITLE, order.size(), order.size(), () -> overlap(spectrum, order)));
        }
        if (!modes.isEmpty()) {
            out.add(new HeatMap("weights", "Weights of the modes", "Size of each mode's weight in every component of the state, relative to the"
                    + " largest weight of the mode, in prepared units: the newest sample of every channel first, then earlier ones.",
                    new HeatMap.Side("mode", modes.stream().map(mode -> Integer.toString(mode.number())).toList(), modes.stream()
                            .map(Matrices::selection).toList()), components(spectrum, modes.get(0).weights().size()), false, weights(modes)).offer());
        }
        return out;
    }

    private static HeatMap overlap(Spectrum spectrum, List<Integer> order) {
        return new HeatMap(OVERLAP, OVERLAP_TITLE, "Size of the inner product of every two eigenfunctions of unit"
                + " length, a conjugate pair as two: 0 for orthogonal ones, 1 for such that cannot be told apart. Where modes overlap, the"
                + " weight of one depends on which others are fitted with it.", eigenfunctions(spectrum), eigenfunctions(spectrum), false,
                overlap(spectrum.vectors(), order));
    }

    private static HeatMap.Side eigenfunctions(Spectrum spectrum) {
        List<Mode> each = spectrum.modes().stream().flatMap(mode -> mode.indices().stream().map(index -> mode)).toList();
        return new HeatMap.Side("mode", each.stream().map(mode -> Integer.toString(mode.number())).toList(),
                each.stream().map(Matrices::selection).toList());
    }

    private static String selection(Mode mode) {
        return "mode:" + mode.number();
    }

    private static DMatrixRMaj overlap(ZMatrixRMaj vectors, List<Integer> order) {
        DMatrixRMaj out = new DMatrixRMaj(order.size(), order.size());
        for (int i = 0; i < order.size(); i++) {
            for (int j = 0; j < order.size(); j++) {
                out.unsafe_set(i, j, product(vectors, order.get(i), order.get(j)));
            }
        }
        return out;
    }

    private static double product(ZMatrixRMaj vectors, int a, int b) {
        double real = 0;
        double imaginary = 0;
        for (int k = 0; k < vectors.numRows; k++) {
            real += vectors.getReal(k, a) * vectors.getReal(k, b) + vectors.getImag(k, a) * vectors.getImag(k, b);
            imaginary += vectors.getReal(k, a) * vectors.getImag(k, b) - vectors.getImag(k, a) * vectors.getReal(k, b);
        }
        return Math.hypot(real, imaginary);
    }

    private static HeatMap.Side components(Spectrum spectrum, int size) {
        List<Channel> channels = spectrum.channels();
        return new HeatMap.Side("channel and delay", IntStream.range(0, size).mapToObj(k -> channels.get(k % channels.size()).name()
                + (k < channels.size() ? "" : ", " + k / channels.size() + " earlier")).toList(), List.of());
    }

    private static DMatrixRMaj weights(List<Mode> modes) {
        DMatrixRMaj out = new DMatrixRMaj(modes.size(), modes.get(0).weights().size());
        for (int i = 0; i < out.numRows; i++) {
            Mode mode = modes.get(i);
            double largest = mode.weights().stream().mapToDouble(weight -> weight.abs()).max().orElse(0);
            for (int k = 0; k < out.numCols; k++) {
                out.unsafe_set(i, k, largest > 0 ? mode.weights().get(k).abs() / largest : 0);
            }
        }
        return out;
    }
}
