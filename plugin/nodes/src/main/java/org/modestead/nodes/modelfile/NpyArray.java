package org.modestead.nodes.modelfile;

import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.Stored;

/**
 * An array as an NPY file, version 1.0: the bytes {@code 93 4E 55 4D 50 59 01 00}, the length of the header in two bytes, the header
 * padded with spaces and a line end to a multiple of 64 bytes, then the entries row by row, least byte first. The format is described in
 * the NumPy reference, {@code numpy.lib.format}.
 */
final class NpyArray {

    private static final byte[] MAGIC = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0};
    private static final int ALIGNMENT = 64;
    private static final int BUFFER = 1 << 13;

    private NpyArray() {}

    static void write(Stored array, OutputStream out) throws IOException {
        out.write(start(ArrayShape.of(array)));
        ByteBuffer buffer = ByteBuffer.allocate(Double.BYTES * BUFFER).order(ByteOrder.LITTLE_ENDIAN);
        if (array instanceof Stored.Wholes wholes) {
            for (int from = 0; from < wholes.values().length; from += BUFFER) {
                int count = Math.min(BUFFER, wholes.values().length - from);
                buffer.asLongBuffer().put(wholes.values(), from, count);
                out.write(buffer.array(), 0, Long.BYTES * count);
            }
            return;
        }
        for (double[] piece : ((Stored.Numbers) array).pieces()) {
            for (int from = 0; from < piece.length; from += BUFFER) {
                int count = Math.min(BUFFER, piece.length - from);
                buffer.asDoubleBuffer().put(piece, from, count);
                out.write(buffer.array(), 0, Double.BYTES * count);
            }
        }
    }

    /** Returns the number of bytes of an array's file. */
    static long size(ArrayShape shape) {
        return start(shape).length + (long) (Double.BYTES * shape.numbers(shape.rows()));
    }

    /**
     * Reads an array.
     *
     * @param reference what it must be
     * @param in read to its end
     */
    static Stored read(ArrayReferences.Reference reference, InputStream in) throws IOException {
        Checksum sum = new Checksum();
        byte[] start = start(reference.shape());
        byte[] found = in.readNBytes(start.length);
        sum.write(found, 0, found.length);
        if (!Arrays.equals(found, start)) {
            throw wrong(reference, "its header is not that of an array of type " + reference.shape().type().word() + " and shape "
                    + reference.shape().dimensions());
        }
        Stored out = reference.shape().type() == ArrayShape.Type.WHOLE ? wholes(reference.shape(), in, sum)
                : numbers(reference.shape(), in, sum);
        if (in.read() >= 0) {
            throw wrong(reference, "it is longer than its shape");
        }
        if (!sum.sha256().equals(reference.sha256())) {
            throw wrong(reference, "its checksum is another one than that in " + ModelFile.INDEX);
        }
        return out;
    }

    private static ModelFileFault wrong(ArrayReferences.Reference reference, String seen) {
        return new ModelFileFault("model file, " + ModelFile.shortened(reference.entry()), seen, "take a file that was not changed");
    }

    private static Stored numbers(ArrayShape shape, InputStream in, Checksum sum) throws IOException {
        List<double[]> pieces = new ArrayList<>(shape.pieces().size());
        for (int rows : shape.pieces()) {
            double[] piece = new double[(int) shape.numbers(rows)];
            for (int from = 0; from < piece.length; from += BUFFER) {
                int count = Math.min(BUFFER, piece.length - from);
                next(count, in, sum).asDoubleBuffer().get(piece, from, count);
            }
            pieces.add(piece);
        }
        return new Stored.Numbers(shape.type() == ArrayShape.Type.COMPLEX, shape.row(), shape.pieces(), pieces);
    }

    private static Stored wholes(ArrayShape shape, InputStream in, Checksum sum) throws IOException {
        long[] values = new long[(int) shape.numbers(shape.rows())];
        for (int from = 0; from < values.length; from += BUFFER) {
            int count = Math.min(BUFFER, values.length - from);
            next(count, in, sum).asLongBuffer().get(values, from, count);
        }
        return new Stored.Wholes(shape.row().isEmpty() ? 1 : shape.row().get(0), values);
    }

    private static ByteBuffer next(int count, InputStream in, Checksum sum) throws IOException {
        byte[] bytes = in.readNBytes(Double.BYTES * count);
        if (bytes.length < Double.BYTES * count) {
            throw new EOFException("an array ends early");
        }
        sum.write(bytes, 0, bytes.length);
        return ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
    }

    private static byte[] start(ArrayShape shape) {
        List<Long> dimensions = shape.dimensions();
        String header = "{'descr': '" + shape.type().word() + "', 'fortran_order': False, 'shape': ("
                + dimensions.stream().map(String::valueOf).collect(Collectors.joining(", ")) + (dimensions.size() == 1 ? "," : "") + "), }";
        int plain = MAGIC.length + Short.BYTES + header.length() + 1;
        int length = (plain + ALIGNMENT - 1) / ALIGNMENT * ALIGNMENT;
        String padded = header + " ".repeat(length - plain) + "\n";
        return ByteBuffer.allocate(length).order(ByteOrder.LITTLE_ENDIAN).put(MAGIC).putShort((short) padded.length())
                .put(padded.getBytes(StandardCharsets.US_ASCII)).array();
    }
}
