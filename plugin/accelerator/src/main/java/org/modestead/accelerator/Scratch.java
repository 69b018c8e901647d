package org.modestead.accelerator;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.DoubleBuffer;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;

/**
 * Memory outside the heap, where native code works: lent, given back and lent again, because the first touch of fresh memory costs more than
 * the copy into it. What is kept for later is limited.
 */
final class Scratch {

    private static final long MOST_KEPT = 256L << 20;

    private final List<ByteBuffer> kept = new ArrayList<>();
    private long size;

    /**
     * Memory on loan.
     *
     * @param doubles as many as asked for, of any content
     */
    record Loan(Scratch owner, ByteBuffer memory, DoubleBuffer doubles) implements AutoCloseable {

        @Override
        public void close() {
            owner.giveBack(memory);
        }
    }

    /** Lends memory for so many numbers. */
    Loan lend(long count) {
        int bytes = Math.toIntExact(Math.max(1, count) * Double.BYTES);
        ByteBuffer memory = taken(bytes);
        return new Loan(this, memory, memory.asDoubleBuffer().slice(0, (int) count));
    }

    /** Lends memory that begins with these numbers. */
    Loan lend(double[] values, int from, int count) {
        Loan loan = lend(count);
        loan.doubles().put(0, values, from, count);
        return loan;
    }

    private ByteBuffer taken(int bytes) {
        synchronized (kept) {
            for (Iterator<ByteBuffer> all = kept.iterator(); all.hasNext();) {
                ByteBuffer one = all.next();
                if (one.capacity() >= bytes && one.capacity() / 4 <= bytes) {
                    all.remove();
                    size -= one.capacity();
                    return one;
                }
            }
        }
        return ByteBuffer.allocateDirect(bytes).order(ByteOrder.nativeOrder());
    }

    private void giveBack(ByteBuffer memory) {
        synchronized (kept) {
            if (size + memory.capacity() <= MOST_KEPT) {
                kept.add(memory);
                size += memory.capacity();
            }
        }
    }
}
