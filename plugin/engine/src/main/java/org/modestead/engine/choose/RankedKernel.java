package org.modestead.engine.choose;

import java.util.Optional;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.kernel.ModeRoom;

/**
 * One kernel with the evidence for it.
 *
 * @param kernel family and parameters
 * @param rank the smallest one that predicts as well as the best within noise; 0 when the kernel could not be fitted
 * @param heldOutError prediction error relative to the spread, NaN when it could not be fitted
 * @param persistenceError of predicting no change, same measure
 * @param verdict whether modes exist in its space, where that was judged
 * @param room which modes its space has room for
 * @param note what follows from the space, or why it could not be fitted
 */
public record RankedKernel(KernelSpec kernel, int rank, double heldOutError, double persistenceError, Optional<KernelVerdict> verdict,
        ModeRoom room, String note) {

    /** Returns whether it could be fitted. */
    public boolean fitted() {
        return Double.isFinite(heldOutError);
    }
}
