package org.modestead.host.table;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.util.Arrays;
import java.util.Optional;
import java.util.stream.DoubleStream;
import org.modestead.engine.Cancelled;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.RowCursor;

/** Steps through the rows of an {@link NpyTable}, some megabytes at a time. */
final class NpyCursor implements RowCursor {

    private static final int CHUNK = 1 << 22;

    private final FileChannel file;
    private final String shown;
    private final NpyHeader header;
    private final boolean list;
    private final ByteBuffer buffer;
    private final double[] numbers;
    private long row;
    private long inBuffer;

    /**
     * @param list whether a row is one cell
     */
    NpyCursor(FileChannel file, String shown, NpyHeader header, boolean list) {
        this.file = file;
        this.shown = shown;
        this.header = header;
        this.list = list;
        int rowBytes = header.columns() * header.bytes();
        this.buffer = ByteBuffer.allocateDirect(rowBytes * (int) Math.min(header.rows(), Math.max(1, CHUNK / rowBytes))).order(ByteOrder.LITTLE_ENDIAN);
        this.numbers = new double[header.columns()];
    }

    @Override
    public boolean next() {
        if (row >= header.rows()) {
            return false;
        }
        if (inBuffer == 0) {
            fill();
        }
        if (header.bytes() == Double.BYTES) {
            buffer.asDoubleBuffer().get(numbers);
            buffer.position(buffer.position() + numbers.length * Double.BYTES);
        } else {
            for (int k = 0; k < numbers.length; k++) {
                numbers[k] = buffer.getFloat();
            }
        }
        inBuffer--;
        row++;
        return true;
    }

    private void fill() {
        Cancelled.ifInterrupted();
        long rowBytes = (long) header.columns() * header.bytes();
        inBuffer = Math.min(buffer.capacity() / rowBytes, header.rows() - row);
        buffer.clear().limit((int) (inBuffer * rowBytes));
        try {
            NpyHeader.fill(file, header.start() + row * rowBytes, buffer);
        } catch (IOException unreadable) {
            Cancelled.ifInterrupted();
            throw new TableFault(shown, "it cannot be read at row " + (row + 1) + " (" + unreadable.getMessage() + ")",
                    "leave the file as it is until the run is over");
        }
    }

    @Override
    public long row() {
        return row;
    }

    @Override
    public boolean isMissing(int column) {
        return !list && Double.isNaN(numbers[column]);
    }

    @Override
    public double number(int column) {
        return numbers[column];
    }

    @Override
    public Optional<double[]> numbers(int column) {
        return Optional.of(numbers);
    }

    @Override
    public Optional<Object> cell(int column) {
        if (list) {
            return Optional.of(new ListCell(DoubleStream.of(numbers)
                    .mapToObj(number -> Double.isNaN(number) ? Optional.empty() : Optional.<Object>of(number)).toList()));
        }
        return isMissing(column) ? Optional.empty() : Optional.of(numbers[column]);
    }

    @Override
    public void close() {
        Arrays.fill(numbers, Double.NaN);
        try {
            file.close();
        } catch (IOException unreadable) {
            throw new TableFault(shown, "it cannot be closed (" + unreadable.getMessage() + ")", "check the disk");
        }
    }
}
