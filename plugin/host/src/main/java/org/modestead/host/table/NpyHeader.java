package org.modestead.host.table;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What an NPY file says of its array: numbers of one size, little end first, row after row.
 *
 * <p>Format: NumPy Enhancement Proposal 1, versions 1 to 3.
 *
 * @param rows at least 1
 * @param columns at least 1
 * @param names of the fields of a structured array; empty otherwise
 * @param bytes of a number, 8 or 4
 * @param start of the first number in the file
 */
record NpyHeader(long rows, int columns, List<String> names, int bytes, long start) {

    private static final String MAGIC = "\u0093NUMPY";
    private static final int FIXED = 12;
    private static final int LONGEST = 1 << 20;
    private static final int LARGEST_ROW = 1 << 27;
    private static final Pattern ORDER = Pattern.compile("'fortran_order'\\s*:\\s*(True|False)");
    private static final Pattern SHAPE = Pattern.compile("'shape'\\s*:\\s*\\(\\s*(\\d+)\\s*(?:,\\s*(\\d+)\\s*)?,?\\s*\\)");
    private static final Pattern PLAIN = Pattern.compile("'descr'\\s*:\\s*'<f([48])'");
    private static final Pattern STRUCTURED = Pattern.compile("'descr'\\s*:\\s*\\[(.*)\\]\\s*,\\s*'fortran_order'");
    private static final Pattern FIELD = Pattern.compile("\\s*\\(\\s*'([^']*)'\\s*,\\s*'<f([48])'\\s*\\)\\s*,?\\s*");

    static NpyHeader read(FileChannel file, String shown) throws IOException {
        ByteBuffer fixed = bytes(file, 0, FIXED, shown);
        String magic = new String(fixed.array(), 0, MAGIC.length(), StandardCharsets.ISO_8859_1);
        int version = fixed.get(MAGIC.length());
        if (!magic.equals(MAGIC) || version < 1 || version > 3) {
            throw new TableFault(shown, "it does not begin as an NPY file of version 1 to 3 does", "save the array with numpy.save");
        }
        int before = version == 1 ? FIXED - 2 : FIXED;
        long length = version == 1 ? Short.toUnsignedInt(fixed.getShort(MAGIC.length() + 2)) : Integer.toUnsignedLong(fixed.getInt(MAGIC.length() + 2));
        if (length > LONGEST) {
            throw new TableFault(shown, "its header is " + length + " bytes long", "give an array of at most some ten thousand fields");
        }
        String text = new String(bytes(file, before, (int) length, shown).array(), StandardCharsets.UTF_8);
        NpyHeader header = parsed(text, before + length, shown);
        if (file.size() - header.start < header.rows * header.columns * header.bytes) {
            throw new TableFault(shown, "it is shorter than its " + header.rows + " rows of " + header.columns + " numbers", "give the complete file");
        }
        return header;
    }

    private static NpyHeader parsed(String text, long start, String shown) {
        Matcher order = ORDER.matcher(text);
        Matcher shape = SHAPE.matcher(text);
        if (!order.find() || !shape.find()) {
            throw new TableFault(shown, "the array has another shape than rows of columns", "save an array of one row a time and one column a channel");
        }
        long rows = Long.parseLong(shape.group(1));
        Matcher plain = PLAIN.matcher(text);
        Matcher structured = STRUCTURED.matcher(text);
        if (plain.find()) {
            long columns = shape.group(2) == null ? 1 : Long.parseLong(shape.group(2));
            checkOrder(order.group(1).equals("True") && columns > 1, shown);
            return checked(rows, columns, List.of(), Integer.parseInt(plain.group(1)), start, shown);
        } else if (structured.find() && shape.group(2) == null) {
            return fields(structured.group(1), rows, start, shown);
        }
        throw new TableFault(shown, "its entries are not numbers of 8 or 4 bytes, little end first", "save it as float64: array.astype('<f8')");
    }

    private static NpyHeader fields(String text, long rows, long start, String shown) {
        List<String> names = new ArrayList<>();
        HashSet<String> sizes = new HashSet<>();
        Matcher field = FIELD.matcher(text);
        int at = 0;
        while (at < text.length() && field.find(at) && field.start() == at) {
            names.add(field.group(1));
            sizes.add(field.group(2));
            at = field.end();
        }
        if (at < text.length() || sizes.size() != 1 || new HashSet<>(names).size() < names.size()) {
            throw new TableFault(shown, "its fields are not all numbers of one size with names of their own", "give every field the type '<f8'");
        }
        return checked(rows, names.size(), names, Integer.parseInt(sizes.iterator().next()), start, shown);
    }

    private static void checkOrder(boolean fortran, String shown) {
        if (fortran) {
            throw new TableFault(shown, "the array lies column after column (fortran_order)", "save numpy.ascontiguousarray of it");
        }
    }

    private static NpyHeader checked(long rows, long columns, List<String> names, int bytes, long start, String shown) {
        if (rows == 0 || columns == 0) {
            throw new TableFault(shown, "the array has " + rows + " rows and " + columns + " columns", "give at least one of each");
        }
        if (columns > LARGEST_ROW) {
            throw new TableFault(shown, "a row has " + columns + " numbers", "give at most " + LARGEST_ROW + " numbers a row");
        }
        return new NpyHeader(rows, (int) columns, names, bytes, start);
    }

    /** Reads bytes at a place, all of them. */
    static ByteBuffer bytes(FileChannel file, long from, int count, String shown) throws IOException {
        ByteBuffer buffer = ByteBuffer.allocate(count).order(ByteOrder.LITTLE_ENDIAN);
        try {
            fill(file, from, buffer);
        } catch (EOFException early) {
            throw new TableFault(shown, "it ends within its header", "give the complete file");
        }
        return buffer;
    }

    /** Reads until a buffer is full, and makes it ready to be taken from. */
    static void fill(FileChannel file, long from, ByteBuffer buffer) throws IOException {
        long at = from;
        while (buffer.hasRemaining()) {
            int read = file.read(buffer, at);
            if (read < 0) {
                throw new EOFException("the file ends early");
            }
            at += read;
        }
        buffer.flip();
    }
}
