package org.modestead.engine.operator;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.StateRun;

/**
 * Which samples of the inputs act between a state and the one a stride later: all those that the state's delays reach back over,
 * because an earlier sample in the state shows what an input did to it since, and those up to the later state. Newest first, and
 * counted from their mean over training: free motion is that under inputs at rest there, which matters where an input multiplies
 * the state.
 *
 * @param use not {@link InputUse#LEFT_IN}
 * @param inputs q, at least 1
 * @param reach samples before its own time that a state reaches back, at least 0
 * @param stride sampling steps from one state to the other, at least 1
 * @param rest mean of each input over training, length q
 */
public record InputWindow(InputUse use, int inputs, int reach, int stride, double[] rest) {

    /** @param runs of the fit, with the inputs of each state's whole reach */
    static InputWindow of(InputUse use, int inputs, int reach, int stride, List<StateRun> runs) {
        double[] rest = new double[inputs];
        double total = runs.stream().mapToDouble(run -> run.weight() * run.count()).sum();
        for (StateRun run : runs) {
            for (int k = 0; k < run.count(); k++) {
                for (int l = 0; l < inputs; l++) {
                    rest[l] += run.weight() * run.inputs().get(k, l) / total;
                }
            }
        }
        return new InputWindow(use, inputs, reach, stride, rest);
    }

    /** Returns how many samples after the state's own are read. */
    int ahead() {
        return use == InputUse.STRAIGHT ? stride : stride - 1;
    }

    /** Returns the number of columns, inputs times samples. */
    int size() {
        return inputs * (reach + 1 + ahead());
    }

    /**
     * Returns the samples for every state of a run; those after its end are taken as held.
     *
     * @param run with the inputs of each state's whole reach
     * @return count x size
     */
    DMatrixRMaj of(StateRun run) {
        DMatrixRMaj out = new DMatrixRMaj(run.count(), size());
        int known = inputs * (reach + 1);
        for (int k = 0; k < run.count(); k++) {
            int at = k * out.numCols;
            for (int later = ahead(); later > 0; later--, at += inputs) {
                System.arraycopy(run.inputs().data, Math.min(k + later, run.count() - 1) * known, out.data, at, inputs);
            }
            System.arraycopy(run.inputs().data, k * known, out.data, at, known);
        }
        return fromRest(out);
    }

    private DMatrixRMaj fromRest(DMatrixRMaj windows) {
        for (int i = 0; i < windows.getNumElements(); i++) {
            windows.data[i] -= rest[i % inputs];
        }
        return windows;
    }

    /**
     * Returns the samples for the state at one sample of a run that is still growing.
     *
     * @param samples p x q, one step apart; after the last they are taken as held
     * @param newest index of the state's newest sample, at least the reach
     * @return 1 x size
     */
    DMatrixRMaj at(DMatrixRMaj samples, int newest) {
        DMatrixRMaj out = new DMatrixRMaj(1, size());
        for (int k = newest + ahead(), at = 0; k >= newest - reach; k--, at += inputs) {
            System.arraycopy(samples.data, Math.min(k, samples.numRows - 1) * inputs, out.data, at, inputs);
        }
        return fromRest(out);
    }
}
