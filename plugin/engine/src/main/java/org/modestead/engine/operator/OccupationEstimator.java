package org.modestead.engine.operator;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.basis.OccupationFunctions;
import org.modestead.engine.basis.OccupationFunctions.Segment;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * The Liouville generator {@code A g = f·∇g} (or the scaled one, {@code A g(x) = a f(x)·∇g(ax)}) on occupation functions,
 * from uneven times as well as even ones. With γ_i running from s_i to e_i:
 *
 * <pre>
 *   G_ij = ∫∫ K(γ_i(s), γ_j(t)) ds dt        M_ij = Γ_j(a e_i) - Γ_j(a s_i)
 *   N_ij = K(ae_i, ae_j) - K(ae_i, as_j) - K(as_i, ae_j) + K(as_i, as_j)      B_ik = ∫ γ_i(t)_k dt
 * </pre>
 *
 * because {@code A* Γ_i = K(., a e_i) - K(., a s_i)}. Rosenfeld, Kamalapurkar, Gruss and Johnson, J. Nonlinear Sci. 32:5,
 * 2022. Up to {@value #DIRECT} samples the arrays are formed; beyond that they are held by landmark features.
 *
 * @param space the kernel
 * @param plan segments
 * @param contraction a in (0, 1]; 1 is the plain generator
 */
public record OccupationEstimator(Kernel space, SegmentPlan plan, double contraction) implements Estimator {

    /** Up to this many samples the arrays are formed entry by entry. */
    static final int DIRECT = 1500;

    private static final int LANDMARKS = 400;
    private static final int LEAST_STEPS = 4;

    /** Checks the range of the contraction. */
    public OccupationEstimator {
        if (!(contraction > 0 && contraction <= 1)) {
            throw new FitFault("scaled generator", "the contraction is " + contraction, "give a contraction above 0 and at most 1");
        }
    }

    @Override
    public String id() {
        return contraction == 1 ? "generator" : "scaled-generator";
    }

    @Override
    public String describe() {
        return (contraction == 1 ? "generator" : "generator scaled by " + contraction) + " on occupation functions of the kernel "
                + space.spec().label();
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return Optional.of(space.spec());
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        List<Segment> segments = Segments.of(snapshots.states(Snapshots.Part.TRAINING), plan);
        if (segments.isEmpty()) {
            throw new FitFault("generator", "no run has two states after delay embedding", "use longer runs or a smaller delay depth");
        }
        int samples = segments.stream().mapToInt(segment -> segment.times().length).sum();
        return samples <= DIRECT ? formed(segments) : factored(segments, progress);
    }

    private Compression formed(List<Segment> segments) {
        OccupationFunctions basis = new OccupationFunctions(space, segments);
        DMatrixRMaj gram = averaged(segments, basis.evaluate(stacked(segments)));
        DMatrixRMaj ends = ends(segments, false);
        DMatrixRMaj starts = ends(segments, true);
        DMatrixRMaj action = difference(basis.evaluate(ends), basis.evaluate(starts));
        DMatrixRMaj second = difference(difference(space.matrix(ends, ends), space.matrix(ends, starts)),
                difference(space.matrix(starts, ends), space.matrix(starts, starts)));
        return weights(segments).functions(new GramCompression(basis, gram, action, second, averaged(segments, stacked(segments)),
                InnerProduct.SPACE, evolution()));
    }

    private Compression factored(List<Segment> segments, Progress progress) {
        DMatrixRMaj nodes = stacked(segments);
        LandmarkFeatures features = LandmarkFeatures.choose(space, nodes, LANDMARKS, progress);
        DMatrixRMaj now = averaged(segments, features.evaluate(nodes));
        DMatrixRMaj next = difference(features.evaluate(ends(segments, false)), features.evaluate(ends(segments, true)));
        RowWeights weights = weights(segments);
        return new FactoredCompression(features, weights.rows(now), weights.rows(next), weights.rows(averaged(segments, nodes)),
                InnerProduct.SPACE, evolution());
    }

    private static RowWeights weights(List<Segment> segments) {
        return RowWeights.of(segments.stream().mapToDouble(Segment::runWeight).toArray());
    }

    private Evolution evolution() {
        return new Evolution.Generator(contraction);
    }

    /** All samples of all segments, one a row. */
    private static DMatrixRMaj stacked(List<Segment> segments) {
        int rows = segments.stream().mapToInt(segment -> segment.states().numRows).sum();
        int n = segments.get(0).states().numCols;
        DMatrixRMaj out = new DMatrixRMaj(rows, n);
        int at = 0;
        for (Segment segment : segments) {
            System.arraycopy(segment.states().data, 0, out.data, at, segment.states().getNumElements());
            at += segment.states().getNumElements();
        }
        return out;
    }

    /** Integrates along each segment the functions given at all stacked samples: (samples x c) to (segments x c). */
    private static DMatrixRMaj averaged(List<Segment> segments, DMatrixRMaj values) {
        DMatrixRMaj out = new DMatrixRMaj(segments.size(), values.numCols);
        int row = 0;
        for (int i = 0; i < segments.size(); i++) {
            for (double weight : segments.get(i).weights()) {
                for (int c = 0; c < values.numCols; c++) {
                    out.data[i * values.numCols + c] += weight * values.data[row * values.numCols + c];
                }
                row++;
            }
        }
        return out;
    }

    private DMatrixRMaj ends(List<Segment> segments, boolean start) {
        int n = segments.get(0).start().length;
        DMatrixRMaj out = new DMatrixRMaj(segments.size(), n);
        for (int i = 0; i < segments.size(); i++) {
            System.arraycopy(start ? segments.get(i).start() : segments.get(i).end(), 0, out.data, i * n, n);
        }
        return contraction == 1 ? out : Matrices.scaled(out, contraction);
    }

    private static DMatrixRMaj difference(DMatrixRMaj a, DMatrixRMaj b) {
        CommonOps_DDRM.subtractEquals(a, b);
        return a;
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        int longest = snapshots.states(Snapshots.Part.TRAINING).stream().mapToInt(StateRun::count).max().orElse(0) - 1;
        int now = plan.samples() == 0 ? longest : plan.samples();
        int other = 2 * now <= longest ? 2 * now : now / 2;
        if (other < LEAST_STEPS) {
            return Optional.empty();
        }
        return Optional.of(new OccupationEstimator(space, new SegmentPlan(other, plan.endSmoothing()), contraction));
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return snapshots.states(Snapshots.Part.TRAINING).stream().map(run -> Segments.of(List.of(run), plan))
                .filter(segments -> !segments.isEmpty()).map(segments -> observed(segments, functions));
    }

    private ObservedRun observed(List<Segment> segments, OrthonormalCompression functions) {
        DMatrixRMaj nodes = stacked(segments);
        return new ObservedRun(averaged(segments, functions.evaluate(nodes)),
                difference(functions.evaluate(ends(segments, false)), functions.evaluate(ends(segments, true))),
                averaged(segments, nodes), 0).weighted(segments.get(0).runWeight());
    }
}
