package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.spectrum.ModalExpansion;

class TracksTest {

    /** A pair that turns and a real direction, of four functions that are there. */
    private static final DMatrixRMaj ACTION = new DMatrixRMaj(new double[][] {{0.6, -0.5, 0.2}, {0.4, 0.7, 0.1}, {0, 0, 0.9}});
    private static final int STATES = 7;

    private final ModalExpansion expansion = ModalExpansion.of(new OrthonormalCompression(new Coordinates(3), CommonOps_DDRM.identity(3), ACTION,
            CommonOps_DDRM.identity(3), CommonOps_DDRM.identity(3), new double[] {1, 1, 1}, STATES, InnerProduct.DATA, new Evolution.StepMap(0.1)));
    private final DMatrixRMaj functions = RandomMatrices_DDRM.rectangle(4, STATES, -1, 1, new Random(3));
    private final Tracks tracks = Tracks.of(expansion, functions);
    private final ZMatrixRMaj expected = ComplexMatrices.product(
            CommonOps_DDRM.transpose(CommonOps_DDRM.extract(functions, 0, 3, 0, STATES), null), expansion.vectors());

    @Test
    void holdTheValuesOfEveryEigenfunctionOneRowForARealOneAndTwoForAPair() {
        assertEquals(3, tracks.values().numRows);
        for (int j = 0; j < 3; j++) {
            Tracks.Track track = tracks.track(j, 2, 4, new Complex[0]);
            for (int k = 0; k < 4; k++) {
                Complex value = ComplexMatrices.entry(expected, k + 2, j);
                assertEquals(value.re(), track.re()[k], 1e-15, "real part");
                assertEquals(value.im(), track.im()[k], 1e-15, "imaginary part");
                assertEquals(value.abs() * value.abs(), track.squares()[k], 1e-15, "square");
            }
        }
    }

    @Test
    void takeWhatInputsAddOffTheValuesAndLeaveTheSizes() {
        Complex pushed = new Complex(0.25, -2);
        for (int j = 0; j < 3; j++) {
            Tracks.Track plain = tracks.track(j, 0, 2, new Complex[0]);
            Tracks.Track free = tracks.track(j, 0, 2, List.of(pushed, Complex.ZERO).toArray(Complex[]::new));
            assertArrayEquals(new double[] {plain.re()[0] - 0.25, plain.re()[1]}, free.re());
            assertArrayEquals(new double[] {plain.im()[0] + 2, plain.im()[1]}, free.im());
            assertArrayEquals(plain.squares(), free.squares());
        }
    }

    @Test
    void measureTheRootMeanSquareOfEveryEigenfunction() {
        double[] sizes = tracks.sizes();
        for (int j = 0; j < 3; j++) {
            double squares = 0;
            for (int k = 0; k < STATES; k++) {
                squares += Math.pow(ComplexMatrices.entry(expected, k, j).abs(), 2);
            }
            assertEquals(Math.sqrt(squares / STATES), sizes[j], 1e-14);
        }
    }
}
