package org.modestead.engine.linalg;

class EjmlAlgebraTest extends LinearAlgebraContract {

    @Override
    protected LinearAlgebra algebra() {
        return new EjmlAlgebra();
    }
}
