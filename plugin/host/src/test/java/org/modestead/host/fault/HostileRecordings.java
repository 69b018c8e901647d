package org.modestead.host.fault;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.IntToDoubleFunction;

/** Six runs of two channels that ring down, with something in them that no instrument records; tables as texts, by what is odd. */
final class HostileRecordings {

    private static final int RUNS = 6;
    private static final int SAMPLES = 40;
    private static final int ODD = 7;

    private HostileRecordings() {}

    /** Recordings that are sound, odd as they look. */
    static Map<String, String> sound() {
        Map<String, String> all = new TreeMap<>();
        all.put("ordinary", table(i -> ring(i), 1, "0"));
        all.put("a constant channel", table(i -> 5, 1, "0"));
        all.put("an offset of 1e12", table(i -> 1e12 + ring(i), 1, "0"));
        all.put("missing cells", table(i -> i % 3 == 1 ? Double.NaN : ring(i), 1, "0"));
        all.put("1e99 once", table(i -> i == ODD ? 1e99 : ring(i), 1, "0"));
        all.put("values of 1e99", table(i -> 1e99 * ring(i), 1, "0"));
        all.put("values of 1e-99", table(i -> 1e-99 * ring(i), 1, "0"));
        all.put("smallest numbers among others", table(i -> i % 5 == 2 ? Double.MIN_VALUE : ring(i), 1, "0"));
        all.put("growth to 1e87", table(i -> Math.exp(5 * (i % SAMPLES)), 1, "0"));
        all.put("times of 1e99", table(i -> ring(i), 1e98, "0"));
        all.put("times of 1e-99", table(i -> ring(i), 1e-98, "0"));
        return all;
    }

    /** Recordings that cannot be used. */
    static Map<String, String> unsound() {
        Map<String, String> all = new TreeMap<>();
        all.put("1e308 once", table(i -> i == ODD ? 1e308 : ring(i), 1, "0"));
        all.put("between -1e308 and 1e308", table(i -> i % 2 == 0 ? 1e308 : -1e308, 1, "0"));
        all.put("an offset of 1e300", table(i -> 1e300 + ring(i), 1, "0"));
        all.put("values of 1e-310", table(i -> 1e-310 * ring(i), 1, "0"));
        all.put("an infinite value", table(i -> i == ODD ? Double.POSITIVE_INFINITY : ring(i), 1, "0"));
        all.put("1e400", table(i -> ring(i), 1, "1e400"));
        all.put("a channel without a number", table(i -> Double.NaN, 1, "0"));
        all.put("constant channels only", table(i -> 3, 1, "0").replaceAll("(?m),[^,]*$", ",y").replaceFirst("y", "b").replace(",y", ",4"));
        all.put("times of 1e308", table(i -> ring(i), 1e307, "0"));
        all.put("times of 1e-310", table(i -> ring(i), 1e-310, "0"));
        all.put("a run kept away that is 1e189 times the others", table(i -> (i / SAMPLES == RUNS - 1 ? 1e99 : 1e-90) * ring(i), 1, "0"));
        return all;
    }

    /**
     * Returns a table of numbers as an NPY file: the columns are {@code column1} to {@code column4}.
     *
     * @param table as above
     */
    static byte[] npy(String table) {
        List<String> rows = table.lines().skip(1).toList();
        byte[] header = String.format(Locale.ROOT, "%-117s%n", "{'descr': '<f8', 'fortran_order': False, 'shape': (" + rows.size() + ", 4), }")
                .getBytes(StandardCharsets.UTF_8);
        ByteBuffer out = ByteBuffer.allocate(10 + header.length + 32 * rows.size()).order(ByteOrder.LITTLE_ENDIAN);
        out.put((byte) 0x93).put("NUMPY".getBytes(StandardCharsets.UTF_8)).put((byte) 1).put((byte) 0).putShort((short) header.length).put(header);
        rows.forEach(row -> List.of(row.split(",")).forEach(cell -> out.putDouble(Double.parseDouble(cell))));
        return out.array();
    }

    private static double ring(int i) {
        return StrictMath.exp(-0.02 * (i % SAMPLES)) * StrictMath.cos(0.5 * (i % SAMPLES) + i / SAMPLES);
    }

    /**
     * @param first channel by the number of the sample over all runs
     * @param step of time
     * @param last cell of the second channel, written as it is; 0 for an ordinary one
     */
    private static String table(IntToDoubleFunction first, double step, String last) {
        StringBuilder rows = new StringBuilder("run,time,a,b\n");
        for (int i = 0; i < RUNS * SAMPLES; i++) {
            double second = StrictMath.exp(-0.02 * (i % SAMPLES)) * StrictMath.sin(0.5 * (i % SAMPLES) + i / SAMPLES);
            boolean written = i == RUNS * SAMPLES - 1 && !last.equals("0");
            rows.append(String.format(Locale.ROOT, "%d,%s,%s,%s%n", i / SAMPLES, step * (i % SAMPLES), first.applyAsDouble(i), written ? last : second));
        }
        return rows.toString();
    }
}
