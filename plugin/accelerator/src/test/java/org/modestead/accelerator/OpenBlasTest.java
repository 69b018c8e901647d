package org.modestead.accelerator;

import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebraContract;

/** The native library does all that is asked of any implementation, at every size. */
class OpenBlasTest extends LinearAlgebraContract {

    @Override
    protected LinearAlgebra algebra() {
        return Library.get().orElseThrow();
    }
}
