package org.modestead.engine.moments;

/**
 * Numbers drawn for names: the same for the same seed, name and index on every machine and in any order. The mixing is that of
 * Steele, Lea and Flood, Fast splittable pseudorandom number generators, OOPSLA 2014, figure 16.
 */
final class SeededDraw {

    private static final long GOLDEN = 0x9e3779b97f4a7c15L;
    /** Three times that, without what is more than 64 bits. */
    private static final long THRICE_GOLDEN = 0xdaa66d2c7ddf743fL;

    private SeededDraw() {}

    /** Returns 64 well mixed bits. */
    static long of(long seed, String name, long index) {
        long state = mixed(seed + GOLDEN);
        for (int i = 0; i < name.length(); i++) {
            state = mixed(state + GOLDEN + name.charAt(i));
        }
        return mixed(state + THRICE_GOLDEN + mixed(index));
    }

    /** Returns bits as a number in [0, 1). */
    static double share(long bits) {
        return (bits >>> 11) * 0x1p-53;
    }

    private static long mixed(long value) {
        long z = value;
        z = (z ^ (z >>> 30)) * 0xbf58476d1ce4e5b9L;
        z = (z ^ (z >>> 27)) * 0x94d049bb133111ebL;
        return z ^ (z >>> 31);
    }
}
