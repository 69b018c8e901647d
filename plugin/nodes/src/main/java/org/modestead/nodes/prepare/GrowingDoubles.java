package org.modestead.nodes.prepare;

import java.util.Arrays;

/** Numbers of which it is not known beforehand how many will come. */
final class GrowingDoubles {

    private static final int FIRST_CAPACITY = 256;
    private double[] values = new double[FIRST_CAPACITY];
    private int size;

    void add(double value) {
        if (size == values.length) {
            values = Arrays.copyOf(values, 2 * size);
        }
        values[size++] = value;
    }

    void add(double[] more) {
        if (size + more.length > values.length) {
            values = Arrays.copyOf(values, Math.max(2 * size, size + more.length));
        }
        System.arraycopy(more, 0, values, size, more.length);
        size += more.length;
    }

    int size() {
        return size;
    }

    double last() {
        return values[size - 1];
    }

    /** Returns a copy of the right length. */
    double[] toArray() {
        return Arrays.copyOf(values, size);
    }
}
