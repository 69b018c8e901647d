package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;

/** Where eigenvalues of an operator must lie so that nothing grows; closed sets. */
public enum StableRegion {

    /** The unit disc, for a map of one step. */
    DISC {
        @Override
        public double excess(Complex value) {
            return Math.max(0, value.abs() - 1);
        }

        @Override
        public double nearest(double value) {
            return Math.max(-1, Math.min(1, value));
        }

        @Override
        DMatrixRMaj drawnIn(DMatrixRMaj a, double excess) {
            return Matrices.scaled(a, 1 / (1 + excess));
        }
    },

    /** The half plane of real parts at most 0, for a generator. */
    HALF_PLANE {
        @Override
        public double excess(Complex value) {
            return Math.max(0, value.re());
        }

        @Override
        public double nearest(double value) {
            return Math.min(0, value);
        }

        @Override
        DMatrixRMaj drawnIn(DMatrixRMaj a, double excess) {
            DMatrixRMaj out = a.copy();
            for (int i = 0; i < a.numRows; i++) {
                out.add(i, i, -excess);
            }
            return out;
        }
    };

    /** Returns how far an eigenvalue lies outside, 0 inside. */
    public abstract double excess(Complex value);

    /** Returns the nearest real number inside. */
    public abstract double nearest(double value);

    /** Returns a matrix all of whose eigenvalues are moved inwards, those outside by no more than the excess to the border. */
    abstract DMatrixRMaj drawnIn(DMatrixRMaj a, double excess);
}
