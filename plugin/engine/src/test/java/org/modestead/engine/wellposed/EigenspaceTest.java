package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.spectrum.ModalExpansion;

class EigenspaceTest {

    private static ModalExpansion expansion(double[][] action, double[][] observable) {
        int r = action.length;
        return ModalExpansion.of(new OrthonormalCompression(new Coordinates(r), org.ejml.dense.row.CommonOps_DDRM.identity(r),
                new DMatrixRMaj(action), org.ejml.dense.row.CommonOps_DDRM.identity(r), new DMatrixRMaj(observable),
                java.util.stream.DoubleStream.generate(() -> 1).limit(r).toArray(), 10, InnerProduct.SPACE, new Evolution.Generator(1)));
    }

    private static Eigenspace of(ModalExpansion expansion, int column) {
        List<List<Integer>> groups = java.util.stream.IntStream.range(0, expansion.rank()).mapToObj(List::of).toList();
        return Eigenspace.of(expansion, groups, column, 10);
    }

    private static int columnOf(ModalExpansion expansion, double rate) {
        for (int j = 0; j < expansion.rank(); j++) {
            if (Math.abs(expansion.rates().get(j).re() - rate) < 1e-9) {
                return j;
            }
        }
        throw new AssertionError("no rate " + rate);
    }

    @Test
    void theGapOfASingleFunctionIsThatOfItsWeights() {
        // eigenvectors (1, 0) of -1 and (1, 1)/√2 of -2; g = q_2 = √2 v_2 - v_1: joint weight of v_1 is -1, its solo weight 0
        ModalExpansion expansion = expansion(new double[][] {{-1, -1}, {0, -2}}, new double[][] {{0}, {1}});
        assertEquals(1, of(expansion, columnOf(expansion, -1)).gap(), 1e-12);
    }

    @Test
    void functionsOfOneRateAreJudgedTogetherWhicheverAreChosenInTheirSpace() {
        // -2 twice, orthogonal to the function of -1: no gap, whatever basis of the space the solver returns
        ModalExpansion expansion = expansion(new double[][] {{-2, 1e-9, 0}, {0, -2, 0}, {0, 0, -1}}, new double[][] {{1}, {0.3}, {0.5}});
        for (int j = 0; j < 3; j++) {
            assertEquals(0, of(expansion, j).gap(), 1e-6);
        }
        Eigenspace twice = of(expansion, expansion.rates().get(0).re() < -1.5 ? 0 : 1);
        assertEquals(2, twice.columns().size());
        // the carrier points along what the signal has in the space: (1, 0.3, 0) normalised
        assertEquals(1 / Math.sqrt(1.09), twice.carrier()[0].abs(), 1e-6);
        assertEquals(0, twice.carrier()[2].abs(), 1e-6);
    }
}
