package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Eigenvalues that rounding cannot tell apart, with parallel eigenfunctions: a (nearly) defective operator has no eigenbasis
 * there; only the span of the cluster has a meaning. Unless one of them carries the signal alone, see {@link CarriedAlone}.
 */
public final class ClusteredEigenvalues implements Check {

    @Override
    public String id() {
        return "clustered-eigenvalues";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().filter(mode -> mode.cluster() != 0)
                .map(mode -> finding(mode, CarriedAlone.at(mode.number(), evidence))).toList();
    }

    private Finding finding(Mode mode, boolean alone) {
        return new Finding(mode.number(), id(), mode.indices().size(), 1, alone, String.format(Locale.ROOT, alone
                ? "%d eigenvalues near %.6g are one as far as rounding can tell, but at a lower rank one of them carries all that they carry, alone and exactly."
                : "%d eigenvalues near %.6g are one as far as rounding can tell, with the same eigenfunction: the motion grows or fades like "
                        + "a power of time times an exponential.", mode.indices().size(), mode.rate().re()));
    }
}
