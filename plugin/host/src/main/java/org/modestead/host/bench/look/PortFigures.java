package org.modestead.host.bench.look;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.figure.EigenvaluePlane;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.LadderFigures;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.figure.ShapeFigures;
import org.modestead.nodes.figure.SingularValues;
import org.modestead.nodes.words.Digits;

/** The pictures of a value on its own, whichever node it comes from: those that the nodes and the report make of it, and a kernel's sections. */
public final class PortFigures {
    private static final int CHANNELS = 8;
    private static final int MODES = 4;
    private static final int POINTS = 241;
    private static final double[] CENTRES = {0, 1, 2};
    private static final double REACH = 3;

    private PortFigures() {}

    /**
     * Returns the pictures of what a port carries; ids are those of the nodes' own pictures, so that none need be shown twice.
     *
     * @param value of any port; a verdict or table on its own has none
     */
    public static List<Figure> of(Object value) {
        if (value instanceof Snapshots snapshots) {
            return List.of(RecordingFigure.figure(snapshots, CHANNELS));
        }
        if (value instanceof Kernel kernel) {
            return List.of(sections(kernel));
        }
        if (value instanceof FittedOperator operator) {
            return List.of(SingularValues.figure(operator));
        }
        if (value instanceof Spectrum spectrum) {
            return spectrum(spectrum, Optional.empty());
        }
        return value instanceof Model model ? model(model) : List.of();
    }

    private static List<Figure> spectrum(Spectrum spectrum, Optional<Verdict> verdict) {
        List<Figure> out = new ArrayList<>();
        out.add(EigenvaluePlane.figure(spectrum, verdict));
        out.addAll(ShapeFigures.figures(spectrum, spectrum.preparation(), MODES));
        return out;
    }

    private static List<Figure> model(Model model) {
        List<Figure> out = new ArrayList<>(spectrum(model.spectrum(), Optional.of(model.verdict())));
        out.addAll(LadderFigures.figures(model.spectrum(), model.verdict()));
        out.add(SingularValues.figure(model.operator()));
        return out;
    }

    /** K(x, z) over one coordinate x, all others zero, for a few z. */
    private static Figure sections(Kernel kernel) {
        double reach = REACH * kernel.spec().scale().orElse(1);
        double[] x = IntStream.range(0, POINTS).mapToDouble(i -> reach * (2.0 * i / (POINTS - 1) - 1)).toArray();
        double[] centres = Arrays.stream(CENTRES).map(centre -> centre * reach / REACH).toArray();
        DMatrixRMaj values = kernel.matrix(new DMatrixRMaj(POINTS, 1, true, x), new DMatrixRMaj(centres.length, 1, true, centres));
        List<Figure.Layer> layers = new ArrayList<>();
        for (int j = 0; j < centres.length; j++) {
            int column = j;
            layers.add(new Figure.Line("centre at " + Digits.cell(centres[j]), "", x,
                    IntStream.range(0, POINTS).mapToDouble(i -> values.get(i, column)).toArray(),
                    j == 0 ? Figure.Emphasis.STRONG : Figure.Emphasis.NORMAL));
        }
        return new Figure("kernel-sections", Figure.Kind.CURVES, "Sections of the kernel", "The functions that the space is made of: "
                + kernel.spec().label() + " between a state and a fixed centre, as one prepared coordinate of the state changes and all others"
                + " are zero.", Figure.Axis.linear("one coordinate of the state [prepared units]"), Figure.Axis.linear("kernel"), layers);
    }
}
