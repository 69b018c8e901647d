package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Numbers of which it may not be known beforehand how many will come, held in parts that are never copied until all are there. */
final class GrowingDoubles {

    private static final int FIRST_CAPACITY = 256;
    private static final int LARGEST_PART = 1 << 21;

    private final List<double[]> full = new ArrayList<>();
    private double[] part;
    private int inPart;
    private int before;

    /** Of which nothing is known. */
    GrowingDoubles() {
        this(FIRST_CAPACITY);
    }

    /** @param expected how many will come in all likelihood: if so, they are held once only */
    GrowingDoubles(int expected) {
        part = new double[expected];
    }

    void add(double value) {
        if (inPart == part.length) {
            next(1);
        }
        part[inPart++] = value;
    }

    void add(double[] more) {
        int here = Math.min(more.length, part.length - inPart);
        System.arraycopy(more, 0, part, inPart, here);
        inPart += here;
        if (here < more.length) {
            next(more.length - here);
            System.arraycopy(more, here, part, 0, more.length - here);
            inPart = more.length - here;
        }
    }

    /** Begins another part, about as large as all before. */
    private void next(int least) {
        full.add(part);
        before = Math.addExact(before, part.length);
        part = new double[Math.max(least, Math.max(FIRST_CAPACITY, Math.min(before, LARGEST_PART)))];
        inPart = 0;
    }

    int size() {
        return Math.addExact(before, inPart);
    }

    double last() {
        return inPart > 0 ? part[inPart - 1] : full.get(full.size() - 1)[full.get(full.size() - 1).length - 1];
    }

    /** Returns them in an array of the right length; nothing may be added afterwards. */
    double[] toArray() {
        if (full.isEmpty()) {
            return inPart == part.length ? part : Arrays.copyOf(part, inPart);
        }
        double[] out = new double[size()];
        int at = 0;
        for (double[] earlier : full) {
            System.arraycopy(earlier, 0, out, at, earlier.length);
            at += earlier.length;
        }
        System.arraycopy(part, 0, out, at, inPart);
        return out;
    }
}
