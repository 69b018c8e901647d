package org.modestead.engine.checks;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.UnaryOperator;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.refine.RefinedRates;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/** Rows C1 and C2 of the table of checks, from recordings and from motions that are integrated independently. */
final class MeasuredSystems {

    private MeasuredSystems() {}

    // ---- C1, NIST ----

    static List<Found> threeDecays(CheckRow row) {
        int j = row.ordinal() - 1;
        boolean rate = row.quantity().startsWith("rate");
        return IntStream.rangeClosed(4, 20).mapToObj(depth -> {
            Mode mode = C1DelayFitTest.slowestFirst(C1DelayFitTest.fit(depth)).get(j);
            return new Found(rate ? -mode.rate().re() : mode.amplitude(), "delay fit of depth " + depth, "", true);
        }).toList();
    }

    static List<Found> threeRoundedDecays(CheckRow row) {
        int j = row.ordinal() - 1;
        // CHECKS C1.2 asks depths 6 to 16
        return IntStream.rangeClosed(6, 16).mapToObj(depth -> {
            List<Mode> modes = delayFit("nist_lanczos3.csv", 0.05, depth, 3).modes().stream()
                    .sorted(Comparator.comparingDouble(mode -> -mode.rate().re())).toList();
            return new Found(-modes.get(j).rate().re(), "delay fit of depth " + depth, "", true);
        }).toList();
    }

    private static Spectrum delayFit(String file, double step, int depth, int rank) {
        Snapshots snapshots = Fits.snapshots(step, depth, List.of(C1OptimisedFitTest.recorded(file)));
        return Fits.spectrum(snapshots, new LinearEstimator(), rank);
    }

    static List<Found> enso(CheckRow row) {
        List<Found> out = new ArrayList<>();
        RefinedRates refined = C1OptimisedFitTest.enso(4);
        if (row.quantity().equals("RSS")) {
            return Found.by("optimised fit", refined.residualSum());
        }
        int term = row.quantity().equals("period_a") ? 2 : 3;
        out.add(Found.of("varpro", "optimised fit", C1OptimisedFitTest.period(refined, term)));
        // at depth 60 the list of checks gives 40.98 itself, 3.3 from the certificate
        double period = periods("nist_enso.csv", 48, 7).stream()
                .min(Comparator.comparingDouble(p -> Math.abs(p - row.expected()))).orElseThrow();
        out.add(Found.of("delay fit", "delay fit of depth 48", period));
        return out;
    }

    /** Periods of a delay fit to samples at unit steps. */
    static List<Double> periods(String file, int depth, int rank) {
        return delayFit(file, 1, depth, rank).modes().stream().filter(Mode::oscillates).map(Mode::period).toList();
    }

    static List<Found> unevenRise(CheckRow row) {
        RefinedRates refined = C1OptimisedFitTest.misra1a(4);
        return Found.by("optimised fit", row.quantity().equals("rate") ? -C1OptimisedFitTest.growth(refined, 1)
                : refined.weights().get(0).get(0, 0));
    }

    // ---- C2.1 to C2.4 ----

    static List<Found> exponential(CheckRow row) {
        DMatrixRMaj found = MatrixExponential.of(new DMatrixRMaj(new double[][] {{-49, 24}, {-64, 31}}));
        int entry = row.quantity().indexOf('[') + 1;
        return Found.by("matrix exponential", found.get(row.quantity().charAt(entry) - '0', row.quantity().charAt(entry + 1)
                - '0'));
    }

    static List<Found> slowManifold(CheckRow row) {
        ModalExpansion expansion = C2KnownSpectraTest.slowExpansion();
        if (row.quantity().startsWith("discrete")) {
            Complex found = expansion.eigenvalues().get(Fits.nearest(expansion.eigenvalues(), row.expected()));
            return Found.by("multiplier from runs", found.im() == 0 ? found.re() : Double.NaN);
        }
        return row.quantity().equals("b")
                ? Found.by("eigenfunction from runs", -C2KnownSpectraTest.slowParabola(expansion))
                : Found.by("carried by the operator from runs", C2KnownSpectraTest.slowForecast()[row.ordinal() - 1]);
    }

    /** By the exact flow, which is a fixture of the tests, and from samples of the integrated equations. */
    static List<Found> stuartLandau(CheckRow row) {
        double mu = C2KnownSpectraTest.GROWTH;
        double[] on = C2KnownSpectraTest.stuartLandau(Math.sqrt(mu), 0, 1);
        double[] off = C2KnownSpectraTest.stuartLandau(0.3, 0, 1);
        double[] ten = C2KnownSpectraTest.stuartLandau(0.1, 0, 10);
        double exponent = Math.log(C2KnownSpectraTest.radial(off) / C2KnownSpectraTest.radial(new double[] {0.3, 0}));
        String exact = "exact formula";
        String data = "from data";
        return switch (row.quantity()) {
            case "radius" -> List.of(Found.fixture(exact, exact, on[0]), Found.of(data, "amplitude of a delay fit on the cycle",
                    cycle().amplitude()));
            case "omega" -> List.of(Found.fixture(exact, exact, on[1]), Found.of(data, "delay fit on the cycle",
                    cycle().rate().im()));
            case "floquet exponent" -> List.of(Found.fixture(exact, exact, exponent), Found.of(data,
                    "delay fit of the squared radius off the cycle", approach()));
            case "floquet multiplier" -> List.of(Found.fixture(exact, exact, Math.exp(exponent * 2 * Math.PI / on[1])),
                    Found.of(data, "the two delay fits", Math.exp(approach() * cycle().period())));
            case "r(10) from 0.1" -> List.of(Found.fixture(exact, exact, ten[0]), Found.of(data,
                    "carried by the operator from runs", ahead()[0]));
            case "theta(10) from 0" -> List.of(Found.fixture(exact, exact, ten[1]), Found.of(data,
                    "carried by the operator from runs", ahead()[1]));
            default -> List.of();
        };
    }

    private static double[] normalForm(double[] z) {
        double square = z[0] * z[0] + z[1] * z[1];
        double growth = C2KnownSpectraTest.GROWTH - square;
        double turn = C2KnownSpectraTest.GAMMA - C2KnownSpectraTest.BETA * square;
        return new double[] {growth * z[0] - turn * z[1], turn * z[0] + growth * z[1]};
    }

    private static Orbit.Oscillation cycle() {
        return Orbit.of(MeasuredSystems::normalForm, new double[] {0.5, 0}, 0, 0.1, 100).cycle(20, z -> z[0]);
    }

    /** r² = μ/(1 + C e^(-2μt)) is a sum of e^(-2μjt): the slowest of these. */
    private static double approach() {
        Orbit orbit = Orbit.of(MeasuredSystems::normalForm, new double[] {0.48, 0}, 0, 0.1, 200);
        return orbit.slowestDecay(20, z -> z[0] * z[0] + z[1] * z[1]);
    }

    private static double[] ahead() {
        UnaryOperator<double[]> polar = p -> new double[] {p[0] * (C2KnownSpectraTest.GROWTH - p[0] * p[0]),
            C2KnownSpectraTest.GAMMA - C2KnownSpectraTest.BETA * p[0] * p[0]};
        List<Run> runs = new ArrayList<>();
        for (double radius : new double[] {0.1, 0.3, 0.8, 1.2}) {
            Orbit orbit = Orbit.of(polar, new double[] {radius, 3 * radius}, 0, 0.05, 41);
            runs.add(Fits.run("from " + radius, 41, 0.05, time -> orbit.states()[(int) Math.round(time / 0.05)]));
        }
        return C2KnownSpectraTest.polar(C2KnownSpectraTest.latticeAhead(Fits.snapshots(0.05, 1, runs)));
    }

    // ---- C2.5 to C2.8 ----

    static List<Found> vanDerPol(CheckRow row) {
        double mu = row.after("mu=");
        List<Found> out = new ArrayList<>(vanDerPol(row.quantity(), mu, settled(mu), "integrated"));
        if (mu == 1) {
            out.addAll(vanDerPol(row.quantity(), mu, recordedCycle(), "recorded cycle"));
        }
        return out;
    }

    private static List<Found> vanDerPol(String quantity, double mu, Orbit orbit, String which) {
        int depth = (int) (0.35 * orbit.states().length);
        return switch (quantity) {
            case "period" -> Found.by("delay fit, " + which, orbit.cycle(depth, x -> x[0]).period());
            case "amplitude" -> Found.by("top of the sum of modes, " + which, orbit.peak(depth, x -> x[0]));
            // Liouville: the exponents add up to the mean divergence, and that along the cycle is 0
            case "floquet_exponent" -> Found.by("constant mode of the divergence, " + which,
                    orbit.mean(depth, x -> mu * (1 - x[0] * x[0])));
            default -> List.of();
        };
    }

    private static Orbit settled(double mu) {
        // thirty-five e-foldings; samples so fine that the harmonics above the Nyquist frequency are below 1e-9
        double settle = 35 / mu;
        double step = mu == 5 ? 0.03 : 0.06;
        int samples = mu == 5 ? 680 : 300;
        return Orbit.of(x -> new double[] {x[1], mu * (1 - x[0] * x[0]) * x[1] - x[0]}, new double[] {2, 0}, settle, step,
                samples);
    }

    /** Two periods of the cycle at mu = 1, 128 samples each. */
    static Orbit recordedCycle() {
        ReferenceTable table = ReferenceTable.read("vdp_mu1_cycle.csv");
        double[][] states = IntStream.range(0, table.rows().size())
                .mapToObj(k -> new double[] {table.number(k, 1), table.number(k, 2)}).toArray(double[][]::new);
        return new Orbit(table.number(1, 0), states);
    }

    static List<Found> duffing(CheckRow row) {
        double from = row.after("amplitude");
        return Found.by("delay fit", Orbit.of(x -> new double[] {x[1], -x[0] - Math.pow(x[0], 3)}, new double[] {from, 0}, 0,
                0.2, 150).cycle(40, x -> x[0]).period());
    }

    static List<Found> pendulum(CheckRow row) {
        double from = Math.toRadians(row.after("pendulum"));
        return Found.by("delay fit", Orbit.of(x -> new double[] {x[1], -Math.sin(x[0])}, new double[] {from, 0}, 0, 0.2, 300)
                .cycle(80, x -> x[0]).period() / (2 * Math.PI));
    }

    static List<Found> lotkaVolterra(CheckRow row) {
        double from = row.after("(1,");
        return Found.by("delay fit", Orbit.of(x -> new double[] {x[0] * (1 - x[1]), x[1] * (x[0] - 1)},
                new double[] {1, from}, 0, 0.15, 250).cycle(80, x -> x[0]).period());
    }

    // ---- C2.12 ----

    /** The temperature at nine points, three modes at once. */
    static List<Found> heat(CheckRow row) {
        Run run = Fits.run("rod", 30, 0.01, time -> IntStream.rangeClosed(1, 9).mapToDouble(i -> IntStream.rangeClosed(1, 3)
                .mapToDouble(k -> Math.sin(k * Math.PI * i / 10) * Math.exp(-k * k * Math.PI * Math.PI * time) / k).sum())
                .toArray());
        Spectrum spectrum = Fits.spectrum(Fits.snapshots(0.01, 1, List.of(run)), new LinearEstimator(), 3);
        double[] rates = spectrum.rates().stream().mapToDouble(Complex::re).sorted().toArray();
        return Found.by("fit of snapshots", rates[3 - row.ordinal()]);
    }
}
