package org.modestead.engine.battery;

/**
 * A system, how it is looked at, and the verdict that is true of the two.
 *
 * @param system moved and recorded
 * @param look functions
 * @param truth derived where the case is written
 */
record Case(KnownSystem system, Look look, Truth truth) {

    String id() {
        return system.name() + " / " + look.name();
    }

    /** Thresholds may be set on these cases; figures are reported on the others, see {@link Fresh}. */
    boolean calibrates() {
        return Battery.calibrating().stream().anyMatch(known -> known.id().equals(id()));
    }
}
