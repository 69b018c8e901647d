package org.modestead.engine.linalg;

class EjmlAlgebraTest extends LinearAlgebraContract {

    @Override
    LinearAlgebra algebra() {
        return new EjmlAlgebra();
    }
}
