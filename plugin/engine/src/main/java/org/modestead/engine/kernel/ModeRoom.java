package org.modestead.engine.kernel;

/**
 * Which modes of the signal a kernel's space has room for, whatever the data.
 *
 * <p>A mode of linear motion x' = Ax is a linear function w·x with wA = λw, one of affine motion x' = Ax + b is
 * w·x + w·b/λ. So the room is decided by whether coordinates and constants belong to the space. Functions that fade
 * at infinity leave less: let φ be one and φ(x(t)) = e^(λt) φ(x(0)) along every run. On a run through all times φ is
 * bounded, so Re λ = 0 where φ is not zero, and then |φ| keeps its size; on a run that leaves every bounded set it also
 * tends to zero, so it is zero there. What remains are modes that neither grow nor decay, on runs that stay bounded:
 * with one coordinate none for any polynomial motion (the Gaussian case: Steinwart, Hush and Scovel, IEEE Trans. Inf.
 * Theory 52:4635, 2006; Minh, Constr. Approx. 32:307, 2010), with two for example (x + iy) exp(-a(x² + y²)) under rotation.
 */
public enum ModeRoom {
    /** Coordinates and constants belong to the space. */
    AFFINE("modes of linear and affine motion", "the coordinates and the constant belong to the space"),
    /** Coordinates belong to it, constants do not. */
    LINEAR("modes of linear motion about zero only",
            "the coordinates belong to the space, the constant does not, so motion about another point has none"),
    /** Neither belongs to it, but products of coordinates do. */
    PRODUCTS("no mode of the signal itself",
            "neither the coordinates nor the constant belong to the space, only products of several coordinates"),
    /** Its functions fade at infinity. */
    STEADY("no mode that grows or decays",
            "functions of the space fade far off, and no polynomial belongs to it, not even the constant"),
    /** Nothing is known. */
    UNKNOWN("not known", "the kernel says nothing of its space");

    private final String phrase;
    private final String reason;

    ModeRoom(String phrase, String reason) {
        this.phrase = phrase;
        this.reason = reason;
    }

    /** Returns what the space holds, without a capital letter. */
    public String phrase() {
        return phrase;
    }

    /** Returns what it holds and why, as one sentence without capital letter and full stop. */
    public String statement() {
        return phrase + ": " + reason;
    }

    /**
     * Returns whether the space can hold a mode that carries the signal's coordinates.
     *
     * @param changes whether the mode grows or decays
     */
    public boolean holds(boolean changes) {
        return switch (this) {
            case AFFINE, LINEAR, UNKNOWN -> true;
            case PRODUCTS -> false;
            case STEADY -> !changes;
        };
    }
}
