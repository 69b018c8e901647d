package org.modestead.host.fault;

import java.util.Random;

/** A reader of something that comes from outside. */
interface FuzzedReader extends AutoCloseable {

    /** Returns what it reads, in words. */
    String name();

    /** Makes the next input. */
    byte[] next(Random random);

    /**
     * Reads it.
     *
     * @return whether it was taken; false when it was refused with sentences
     * @throws org.modestead.engine.Fault when it is refused with a sentence
     * @throws Exception only by a defect
     */
    boolean read(byte[] input) throws Exception;

    @Override
    default void close() {
        // most hold nothing
    }
}
