package org.modestead.engine.moments;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.recording.Preparation;

/**
 * What must be known before snapshot pairs can be summed up; every machine that takes part has the same one.
 *
 * @param step usual time from row to row
 * @param preparation of recorded values; for coordinates only a first guess, for the others final
 * @param basis functions of the prepared state that are summed up
 * @param conditioner of these functions
 */
public record Pilot(double step, Preparation preparation, FunctionBasis basis, Conditioner conditioner) {

    private static final int MOST_STATES = 8192;

    /**
     * @param plan what is asked
     * @param survey of all rows where the plan needs that, else of the first ones
     * @param progress polled for cancel
     * @throws FitFault if no state is there
     */
    public static Pilot of(StreamPlan plan, Moments survey, Progress progress) {
        boolean coordinates = plan.features() instanceof Features.Coordinates;
        ChannelMoments channels = survey.channels().count() > 0 ? survey.channels() : anyOf(plan, survey);
        Preparation preparation = coordinates ? standardised(channels) : StreamPreparation.of(plan, survey.channels());
        DMatrixRMaj states = states(plan, survey, preparation);
        FunctionBasis basis = basis(plan, states, progress);
        DMatrixRMaj some = states.numRows <= MOST_STATES ? states : thinned(states);
        return new Pilot(plan.step().orElse(survey.steps().mean()), preparation, basis, Conditioner.of(basis.evaluate(some)));
    }

    /**
     * Returns states of a survey, prepared by its own moments: those from which a pair begins.
     *
     * @throws RecordingFault if there is none
     */
    public static DMatrixRMaj states(StreamPlan plan, Moments survey) {
        ChannelMoments channels = survey.channels().count() > 0 ? survey.channels() : anyOf(plan, survey);
        return states(plan, survey, StreamPreparation.of(plan, channels));
    }

    private static FunctionBasis basis(StreamPlan plan, DMatrixRMaj states, Progress progress) {
        if (plan.features() instanceof Features.Landmarks landmarks) {
            return LandmarkFeatures.choose(landmarks.kernelMade(), states, landmarks.landmarks(), progress);
        }
        if (plan.features().estimator(plan.stride()) instanceof DictionaryEstimator explicit) {
            return explicit.dictionary().on(plan.stateSize());
        }
        return coordinates(plan);
    }

    /** Returns the functions that are summed up for a fit in the coordinates. */
    public static FunctionBasis coordinates(StreamPlan plan) {
        return new ConstantAndCoordinates(plan.stateSize());
    }

    /** Returns the number of state components that are summed up against the functions, none where they are the functions. */
    public static int observed(StreamPlan plan) {
        return plan.features() instanceof Features.Coordinates ? 0 : plan.stateSize();
    }

    /** The first rows may all be kept away from the fit; for a first guess they serve nevertheless. */
    private static ChannelMoments anyOf(StreamPlan plan, Moments survey) {
        return survey.stretches().map(stretch -> ChannelMoments.of(stretch.values().data, plan.channels().size(), 0, stretch.samples()))
                .reduce(ChannelMoments.none(plan.channels().size()), ChannelMoments::plus);
    }

    private static Preparation standardised(ChannelMoments channels) {
        int n = channels.mean().length;
        double[] scale = new double[n];
        for (int c = 0; c < n; c++) {
            double deviation = Math.sqrt(channels.variance(c));
            scale[c] = deviation > 0 ? deviation : 1;
        }
        return new Preparation(0, channels.mean(), new double[n], scale);
    }

    /** Earlier states of the pairs in what was kept; of any part where nothing of the training part was. */
    private static DMatrixRMaj states(StreamPlan plan, Moments survey, Preparation preparation) {
        List<KeptStretch> kept = new ArrayList<>(survey.training().kept());
        if (kept.isEmpty()) {
            survey.stretches().forEach(kept::add);
        }
        kept.sort(KeptStretch.IN_ORDER);
        List<DMatrixRMaj> blocks = new ArrayList<>();
        int rows = 0;
        for (KeptStretch stretch : kept) {
            int pairs = stretch.samples() - plan.pairReach();
            if (pairs > 0) {
                blocks.add(DelayedStates.of(plan.delay(), stretch.times(), stretch.values().data, plan.channels().size(), preparation, 0, pairs));
                rows += pairs;
            }
        }
        if (rows == 0) {
            throw new RecordingFault("recording", "no stretch of the first rows has the " + (plan.pairReach() + 1)
                    + " samples in a row that a pair of states needs", "choose a smaller delay depth, a larger gap factor or longer stretches");
        }
        return stacked(blocks, rows);
    }

    private static DMatrixRMaj stacked(List<DMatrixRMaj> blocks, int rows) {
        DMatrixRMaj out = new DMatrixRMaj(rows, blocks.get(0).numCols);
        int at = 0;
        for (DMatrixRMaj block : blocks) {
            System.arraycopy(block.data, 0, out.data, at, block.getNumElements());
            at += block.getNumElements();
        }
        return out;
    }

    private static DMatrixRMaj thinned(DMatrixRMaj states) {
        int n = states.numCols;
        DMatrixRMaj out = new DMatrixRMaj(MOST_STATES, n);
        for (int i = 0; i < MOST_STATES; i++) {
            int row = (int) ((long) i * states.numRows / MOST_STATES);
            System.arraycopy(states.data, row * n, out.data, i * n, n);
        }
        return out;
    }
}
