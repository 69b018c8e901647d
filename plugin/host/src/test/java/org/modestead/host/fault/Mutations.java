package org.modestead.host.fault;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Random;

/**
 * Changes inputs as accidents and malice do: bits flipped, parts cut, doubled or moved, words put in that readers stumble over.
 *
 * @param random the one generator that everything is drawn from
 */
record Mutations(Random random) {

    private static final int LONGEST = 1 << 16;
    private static final int DEEP = 2000;

    /** What readers stumble over. */
    private static final List<String> WORDS = List.of("0", "-1", "1", "-0.0", "1e308", "-1e308", "1e309", "4.9e-324", "NaN", "Infinity", "-Infinity",
            "\"NaN\"", "\"Infinity\"", "2147483647", "2147483648", "-2147483648", "9223372036854775807", "9223372036854775808", "1e400", "0x10", "1_000",
            "true", "null", "[]", "{}", "[[", "{\"a\":", "\"", "\"\"", "'", ",", ";", "\t", "\n", "\r", "\r\n", "\0", "\ufeff", "\\u0000", "\\ud800", "\u00e9",
            "\ud83d\ude00", "../../../../etc/passwd", "/etc/passwd", "..\\..\\", "C:\\", "file:///etc/passwd", "%s%n%x", "%2e%2e%2f", "${jndi:x}", "$(id)",
            "'; DROP TABLE input; --", "<script>", "2015-06-30", "2015-06-30T12:00:00", "-999999999-01-01", "0000-00-00", "1,5", "a b", "run", "time", "x",
            "\"seed\"", "\"steps\"", "\"version\"", "\"settings\"", "\"id\"");

    /** Returns a text with one to four changes. */
    byte[] text(byte[] sample, byte[] other) {
        byte[] out = sample;
        for (int k = random.nextInt(4); k >= 0; k--) {
            out = switch (random.nextInt(12)) {
                case 0 -> bits(out);
                case 1 -> cut(out);
                case 2 -> doubled(out);
                case 3 -> spliced(out, other);
                case 4 -> Arrays.copyOf(out, random.nextInt(out.length + 1));
                case 5, 6, 7 -> token(out);
                case 8, 9, 10 -> inserted(out, word());
                default -> random.nextInt(40) == 0 ? inserted(out, word().repeat(1 + random.nextInt(DEEP))) : inserted(out, word());
            };
        }
        return out.length > LONGEST ? Arrays.copyOf(out, LONGEST) : out;
    }

    /** Returns one of the words. */
    String word() {
        return WORDS.get(random.nextInt(WORDS.size()));
    }

    /** Returns bytes with a few bits or bytes changed. */
    byte[] bits(byte[] sample) {
        byte[] out = sample.clone();
        for (int k = random.nextInt(6); k >= 0 && out.length > 0; k--) {
            int at = random.nextInt(random.nextBoolean() ? out.length : Math.min(out.length, 2000));
            out[at] = (byte) (random.nextBoolean() ? random.nextInt(256) : out[at] ^ 1 << random.nextInt(8));
        }
        return out;
    }

    private byte[] cut(byte[] sample) {
        int from = random.nextInt(sample.length + 1);
        int to = Math.min(sample.length, from + random.nextInt(40));
        return joined(Arrays.copyOf(sample, from), Arrays.copyOfRange(sample, to, sample.length));
    }

    private byte[] doubled(byte[] sample) {
        int from = random.nextInt(sample.length + 1);
        int to = Math.min(sample.length, from + random.nextInt(200));
        return joined(Arrays.copyOf(sample, to), Arrays.copyOfRange(sample, from, sample.length));
    }

    private byte[] spliced(byte[] sample, byte[] other) {
        return joined(Arrays.copyOf(sample, random.nextInt(sample.length + 1)), Arrays.copyOfRange(other, random.nextInt(other.length + 1), other.length));
    }

    private byte[] inserted(byte[] sample, String word) {
        int at = random.nextInt(sample.length + 1);
        return joined(joined(Arrays.copyOf(sample, at), word.getBytes(StandardCharsets.UTF_8)), Arrays.copyOfRange(sample, at, sample.length));
    }

    /** Exchanges a run of letters and digits. */
    private byte[] token(byte[] sample) {
        if (sample.length == 0) {
            return sample;
        }
        int at = random.nextInt(sample.length);
        int from = at;
        int to = at;
        while (from > 0 && isWord(sample[from - 1])) {
            from--;
        }
        while (to < sample.length && isWord(sample[to])) {
            to++;
        }
        return joined(joined(Arrays.copyOf(sample, from), word().getBytes(StandardCharsets.UTF_8)), Arrays.copyOfRange(sample, to, sample.length));
    }

    private static boolean isWord(byte letter) {
        return Character.isLetterOrDigit(letter) || letter == '.' || letter == '-' || letter == '+' || letter == '_';
    }

    private static byte[] joined(byte[] head, byte[] tail) {
        byte[] out = Arrays.copyOf(head, head.length + tail.length);
        System.arraycopy(tail, 0, out, head.length, tail.length);
        return out;
    }
}
