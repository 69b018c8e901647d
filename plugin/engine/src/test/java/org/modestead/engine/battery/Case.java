package org.modestead.engine.battery;

import java.nio.charset.StandardCharsets;
import java.util.zip.CRC32;

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

    /**
     * Thresholds may be set on these cases; figures are reported on the others. The rule is the parity of the id's
     * CRC-32.
     */
    boolean calibrates() {
        CRC32 sum = new CRC32();
        sum.update(id().getBytes(StandardCharsets.UTF_8));
        return sum.getValue() % 2 == 0;
    }
}
