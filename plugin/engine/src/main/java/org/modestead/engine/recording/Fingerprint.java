package org.modestead.engine.recording;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * Tells whether two fits saw the same data: SHA-256 over names and units of channels and inputs, how they were prepared, and every run of
 * every part with its times, values and inputs, bit for bit.
 */
public final class Fingerprint {

    private final MessageDigest digest;

    private Fingerprint(MessageDigest digest) {
        this.digest = digest;
    }

    /** Returns 64 hexadecimal digits. */
    public static String of(Snapshots snapshots) {
        try {
            Fingerprint print = new Fingerprint(MessageDigest.getInstance("SHA-256"));
            print.add(snapshots);
            return HexFormat.of().formatHex(print.digest.digest());
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException("every Java has SHA-256", impossible);
        }
    }

    private void add(Snapshots snapshots) {
        snapshots.channels().forEach(channel -> add(channel.label()));
        snapshots.inputs().forEach(input -> add(input.label()));
        add(snapshots.time().kind() + " " + snapshots.time().unit());
        Preparation preparation = snapshots.preparation();
        add(preparation.origin());
        add(preparation.offset());
        add(preparation.slope());
        add(preparation.scale());
        for (Part part : Part.values()) {
            add(part.name());
            for (Run run : snapshots.runs(part)) {
                add(run.id());
                add(run.times());
                add(run.values().data, run.values().getNumElements());
                add(run.inputs().data, run.inputs().getNumElements());
            }
        }
    }

    private void add(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        digest.update(ByteBuffer.allocate(Integer.BYTES).putInt(bytes.length).flip());
        digest.update(bytes);
    }

    private void add(double... values) {
        add(values, values.length);
    }

    private void add(double[] values, int count) {
        digest.update(ByteBuffer.allocate(Integer.BYTES).putInt(count).flip());
        ByteBuffer bytes = ByteBuffer.allocate(Double.BYTES);
        for (int i = 0; i < count; i++) {
            digest.update(bytes.clear().putDouble(values[i]).flip());
        }
    }
}
