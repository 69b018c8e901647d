package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;

/**
 * Modes of two spectra held against each other: likeness of the shapes ({@link ModalAssurance}) of all pairs, and which of them pair
 * up. Shapes are those of the newest sample over the channels that both spectra have, matched by name.
 *
 * <p>Pairs are an optimal assignment on {@code 1 - MAC + relative change of the frequency}, among those within the limits.
 *
 * @param channels names that both have, in the order of the first spectrum
 * @param leftOut names that only one of them has
 * @param pairs every mode of the first with every mode of the second, in order
 */
public record ShapeComparison(List<String> channels, List<String> leftOut, List<Pair> pairs) {

    private static final double TOO_FAR = 2;

    /** Takes immutable copies. */
    public ShapeComparison {
        channels = List.copyOf(channels);
        leftOut = List.copyOf(leftOut);
        pairs = List.copyOf(pairs);
    }

    /**
     * Two modes.
     *
     * @param a of the first spectrum
     * @param b of the second
     * @param assurance in [0, 1]; 0 where a shape vanishes on the common channels
     * @param paired whether they are taken for the same mode
     */
    public record Pair(Mode a, Mode b, double assurance, boolean paired) {

        /** Returns {@code f_b/f_a - 1}, NaN where the first does not oscillate. */
        public double frequencyChange() {
            return a.oscillates() ? b.frequency() / a.frequency() - 1 : Double.NaN;
        }
    }

    /**
     * Compares the modes that are not the constant.
     *
     * @param a first spectrum
     * @param b second spectrum, of the same time unit
     * @param scaling units of the shapes
     * @param limits from where on two modes may be the same
     * @param most number of modes of each, strongest first
     * @throws FitFault if they share no channel, or count time differently
     */
    public static ShapeComparison of(Spectrum a, Spectrum b, ShapeScaling scaling, ComparisonLimits limits, int most) {
        List<String> namesA = a.channels().stream().map(Channel::name).toList();
        List<String> namesB = b.channels().stream().map(Channel::name).toList();
        List<String> common = namesA.stream().filter(namesB::contains).toList();
        if (common.isEmpty()) {
            throw new FitFault("comparison of shapes", "the first spectrum has the channels " + String.join(", ", namesA)
                    + ", the second " + String.join(", ", namesB), "name at least one channel alike in both recordings");
        }
        if (!a.timeUnit().equals(b.timeUnit())) {
            throw new FitFault("comparison of shapes", "the first spectrum counts time in " + a.timeUnit() + ", the second in " + b.timeUnit(),
                    "give both recordings one time unit");
        }
        double[] factors = factors(a, b, common, scaling);
        List<Mode> modesA = strongest(a, most);
        List<Mode> modesB = strongest(b, most);
        double[][] assurance = new double[modesA.size()][modesB.size()];
        for (int i = 0; i < modesA.size(); i++) {
            for (int j = 0; j < modesB.size(); j++) {
                assurance[i][j] = ModalAssurance.orNone(shape(a, modesA.get(i), common, factors), shape(b, modesB.get(j), common, factors));
            }
        }
        List<String> leftOut = java.util.stream.Stream.concat(namesA.stream(), namesB.stream()).filter(name -> !common.contains(name)).toList();
        return new ShapeComparison(common, leftOut, pairs(modesA, modesB, assurance, limits));
    }

    /** By which recorded components are divided. */
    private static double[] factors(Spectrum a, Spectrum b, List<String> common, ShapeScaling scaling) {
        return common.stream().mapToDouble(name -> scaling == ShapeScaling.RECORDED ? 1
                : Math.sqrt(a.preparation().scale()[index(a, name)] * b.preparation().scale()[index(b, name)])).toArray();
    }

    private static int index(Spectrum spectrum, String name) {
        return IntStream.range(0, spectrum.channels().size()).filter(k -> spectrum.channels().get(k).name().equals(name)).findFirst()
                .orElseThrow();
    }

    private static List<Mode> strongest(Spectrum spectrum, int most) {
        return spectrum.modes().stream().filter(mode -> !mode.constant()).limit(most).toList();
    }

    private static List<Complex> shape(Spectrum spectrum, Mode mode, List<String> common, double[] factors) {
        List<Complex> shape = new ArrayList<>();
        for (int k = 0; k < factors.length; k++) {
            int channel = index(spectrum, common.get(k));
            shape.add(mode.weights().get(channel).times(spectrum.preparation().scale()[channel] / factors[k]));
        }
        return shape;
    }

    private static List<Pair> pairs(List<Mode> a, List<Mode> b, double[][] assurance, ComparisonLimits limits) {
        double[][] cost = new double[a.size()][b.size()];
        for (int i = 0; i < a.size(); i++) {
            for (int j = 0; j < b.size(); j++) {
                double change = change(a.get(i), b.get(j));
                boolean same = assurance[i][j] >= limits.assurance() && change <= limits.change();
                cost[i][j] = same ? 1 - assurance[i][j] + change : 2 * TOO_FAR;
            }
        }
        int[] matched = Matching.of(cost, TOO_FAR);
        List<Pair> pairs = new ArrayList<>();
        for (int i = 0; i < a.size(); i++) {
            for (int j = 0; j < b.size(); j++) {
                pairs.add(new Pair(a.get(i), b.get(j), assurance[i][j], matched[i] == j));
            }
        }
        return pairs;
    }

    /** Of the frequency between oscillations, of the growth rate between motions that do not oscillate; else infinite. */
    private static double change(Mode a, Mode b) {
        if (a.oscillates() != b.oscillates()) {
            return Double.POSITIVE_INFINITY;
        }
        double first = a.oscillates() ? a.frequency() : a.rate().re();
        double second = b.oscillates() ? b.frequency() : b.rate().re();
        return first == second ? 0 : Math.abs(first - second) / Math.max(Math.abs(first), Math.abs(second));
    }
}
