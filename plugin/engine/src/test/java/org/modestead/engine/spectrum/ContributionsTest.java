package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Random;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.RandomMatrices_ZDRM;
import org.junit.jupiter.api.Test;

/** The size of a mode of very many channels is that of its contributions, though these are not formed. */
class ContributionsTest {

    @Test
    void productsGiveTheMeanSquareOfWhatIsNotFormed() {
        ZMatrixRMaj functions = RandomMatrices_ZDRM.rectangle(30, 4, new Random(1));
        ZMatrixRMaj joint = RandomMatrices_ZDRM.rectangle(4, 2500, new Random(2));
        for (List<Integer> group : List.of(List.of(2), List.of(0, 3), List.of(0, 1, 2))) {
            double formed = Contributions.meanSquare(Contributions.of(functions, joint, group, 500, 2000));
            // sums of 60 000 positive terms: rounding grows with the root of their number at most
            assertEquals(formed, Contributions.meanSquare(functions, joint, group, 500, 2000), 1e-12 * formed);
        }
    }
}
