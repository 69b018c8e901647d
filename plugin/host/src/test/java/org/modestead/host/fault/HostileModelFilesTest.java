package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import java.util.zip.CRC32;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.MomentFiles;
import org.modestead.nodes.modelfile.PortFiles;

/** Model files and files of sums that somebody made to do harm are refused with a sentence, by the real readers, in bounded memory. */
class HostileModelFilesTest {

    /** What an entry unpacks to; packed it is a thousandth. */
    private static final int BOMB = 10 << 20;
    private static final long MOST_PACKED = 64_000;
    /** An array's entry is never read further than its shape; the buffers of both need this at most. */
    private static final long MOST_FOR_AN_ARRAY = 8_000_000;
    /** An index may be as long as the bomb: its bytes, and twice that while they are gathered. */
    private static final long MOST_FOR_AN_INDEX = 4L * BOMB;
    /** Where the size stands in the head of an entry, and where its name begins. */
    private static final int SIZE_AT = 22;
    private static final int NAME_AT = 30;

    private interface Reader {
        void read(byte[] file) throws IOException;
    }

    private record Sample(String name, List<ModelFuzz.Entry> entries, Reader reader) {

        /** Returns the entries with the bytes of one changed. */
        List<ModelFuzz.Entry> with(int at, byte[] bytes) {
            List<ModelFuzz.Entry> out = new ArrayList<>(entries);
            out.set(at, new ModelFuzz.Entry(entries.get(at).name(), bytes));
            return out;
        }
    }

    private static List<Sample> samples() throws IOException {
        Path kept;
        try (Stream<Path> all = Files.list(Path.of("../nodes/src/test/resources/org/modestead/nodes/modelfile"))) {
            kept = all.filter(path -> path.toString().endsWith(".zip")).sorted().findFirst().orElseThrow();
        }
        return List.of(new Sample("model", ModelFuzz.entries(Files.readAllBytes(kept)), file -> PortFiles.read(PortType.MODEL, new ByteArrayInputStream(file))),
                new Sample("moments", ModelFuzz.entries(SampleSums.file()), file -> MomentFiles.read(new ByteArrayInputStream(file))));
    }

    @Test
    void whatIsPackedAnewIsRead() throws IOException {
        for (Sample sample : samples()) {
            sample.reader().read(ModelFuzz.zip(sample.entries()));
        }
    }

    @Test
    void anArrayThatUnpacksToAThousandTimesItsSize() throws IOException {
        for (Sample sample : samples()) {
            byte[] array = sample.entries().get(1).bytes();
            byte[] bomb = ModelFuzz.zip(sample.with(1, Arrays.copyOf(array, BOMB)));
            assertRefused(sample, bomb, "it is longer than its shape", MOST_FOR_AN_ARRAY);
            assertRefused(sample, ModelFuzz.zip(sample.with(1, new byte[BOMB])), "its header is not that of an array", MOST_FOR_AN_ARRAY);
        }
    }

    /** The head of the entry says the size that is right, and the data unpack to more. */
    @Test
    void anArrayWhoseHeadSaysASmallSize() throws IOException {
        for (Sample sample : samples()) {
            ModelFuzz.Entry array = sample.entries().get(1);
            byte[] honest = sized(sample.with(1, Arrays.copyOf(array.bytes(), BOMB)), 1, BOMB);
            assertRefused(sample, honest, "an entry of " + BOMB + " bytes", MOST_FOR_AN_ARRAY);
            byte[] lie = sized(sample.with(1, Arrays.copyOf(array.bytes(), BOMB)), 1, array.bytes().length);
            assertRefused(sample, lie, "it is longer than its shape", MOST_FOR_AN_ARRAY);
        }
    }

    @Test
    void anIndexThatUnpacksToAThousandTimesItsSize() throws IOException {
        for (Sample sample : samples()) {
            assertRefused(sample, ModelFuzz.zip(sample.with(0, new byte[BOMB])), "it is not the JSON that is expected", MOST_FOR_AN_INDEX);
            assertRefused(sample, sized(sample.with(0, new byte[BOMB]), 0, 100), "", MOST_FOR_AN_INDEX);
        }
    }

    /** A zip in a zip is not unpacked. */
    @Test
    void aBombInAnEntryStaysPacked() throws IOException {
        for (Sample sample : samples()) {
            byte[] bomb = ModelFuzz.zip(sample.with(1, new byte[BOMB]));
            assertRefused(sample, ModelFuzz.zip(sample.with(1, bomb)), "its header is not that of an array", MOST_FOR_AN_ARRAY);
            assertRefused(sample, ModelFuzz.zip(sample.with(0, bomb)), "it is not the JSON that is expected", MOST_FOR_AN_ARRAY);
        }
    }

    /** Shapes that multiply to more than the memory, or beyond what a number of 64 bits counts. */
    @Test
    void arraysWhoseShapesAreHuge() throws IOException {
        for (Sample sample : samples()) {
            String index = new String(sample.entries().get(0).bytes(), StandardCharsets.UTF_8);
            for (String shape : List.of("[ 2147483639 ]", "[ 2147483639, 536870911 ]", "[ 2147483639, 2147483639, 2147483639 ]", "[ -1 ]")) {
                byte[] changed = index.replaceFirst("\"shape\" : \\[[^]]*\\]", "\"shape\" : " + shape).getBytes(StandardCharsets.UTF_8);
                assertRefused(sample, ModelFuzz.zip(sample.with(0, changed)), "", MOST_FOR_AN_ARRAY);
            }
        }
    }

    /** Nothing is ever unpacked to a file, and a name that the index does not hold is refused. */
    @Test
    void namesThatLeadOutOfTheFolder() throws IOException {
        for (Sample sample : samples()) {
            for (String name : List.of("../../outside.npy", "/etc/outside.npy", "..\\outside.npy", "C:\\outside.npy", "a/../../outside.npy")) {
                List<ModelFuzz.Entry> entries = new ArrayList<>(sample.entries());
                entries.add(new ModelFuzz.Entry(name, new byte[BOMB]));
                assertRefused(sample, ModelFuzz.zip(entries), "an entry that model.json does not name", MOST_FOR_AN_ARRAY);
            }
        }
    }

    @Test
    void anIndexNestedTooDeepOrWithAFieldTwice() throws IOException {
        for (Sample sample : samples()) {
            String index = new String(sample.entries().get(0).bytes(), StandardCharsets.UTF_8);
            for (String head : List.of("{\"a\" : " + "[".repeat(100_000), "{\"a\":".repeat(100_000), "{ \"format\" : \"modestead-model\",")) {
                byte[] changed = (head + index.substring(1)).getBytes(StandardCharsets.UTF_8);
                assertRefused(sample, ModelFuzz.zip(sample.with(0, changed)), "it is not the JSON that is expected", MOST_FOR_AN_ARRAY);
            }
        }
    }

    private static void assertRefused(Sample sample, byte[] file, String seen, long mostBytes) {
        assertTrue(file.length < MOST_PACKED + sample.entries().stream().mapToLong(entry -> entry.bytes().length).sum(), file.length + " bytes");
        long before = allocated();
        String told = assertThrows(ModelFileFault.class, () -> sample.reader().read(file), sample.name()).getMessage();
        long bytes = allocated() - before;
        assertTrue(told.contains(seen) && told.lines().count() == 1 && !told.contains("Exception"), sample.name() + ": " + told);
        assertTrue(bytes < mostBytes, sample.name() + ": " + bytes + " bytes for: " + told);
    }

    private static long allocated() {
        return ((ThreadMXBean) ManagementFactory.getThreadMXBean()).getThreadAllocatedBytes(Thread.currentThread().getId());
    }

    /** Packs the entries, the head of one of them with a size, true or not; without, sizes stand after the data. */
    private static byte[] sized(List<ModelFuzz.Entry> entries, int at, int size) throws IOException {
        String name = entries.get(at).name();
        byte[] file = zip(entries, at, packedSize(entries, at));
        byte[] letters = name.getBytes(StandardCharsets.UTF_8);
        int head = 0;
        while (!Arrays.equals(letters, 0, letters.length, file, head + NAME_AT, head + NAME_AT + letters.length)) {
            head++;
        }
        assertEquals('P', file[head]);
        ByteBuffer.wrap(file).order(ByteOrder.LITTLE_ENDIAN).putInt(head + SIZE_AT, size);
        return file;
    }

    private static long packedSize(List<ModelFuzz.Entry> entries, int at) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (ZipOutputStream zip = new ZipOutputStream(out)) {
            ZipEntry entry = new ZipEntry(entries.get(at).name());
            zip.putNextEntry(entry);
            zip.write(entries.get(at).bytes());
            zip.closeEntry();
            return entry.getCompressedSize();
        }
    }

    private static byte[] zip(List<ModelFuzz.Entry> entries, int at, long packed) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (ZipOutputStream zip = new ZipOutputStream(out)) {
            for (int i = 0; i < entries.size(); i++) {
                ZipEntry entry = new ZipEntry(entries.get(i).name());
                byte[] bytes = entries.get(i).bytes();
                if (i == at) {
                    CRC32 sum = new CRC32();
                    sum.update(bytes);
                    entry.setSize(bytes.length);
                    entry.setCompressedSize(packed);
                    entry.setCrc(sum.getValue());
                }
                zip.putNextEntry(entry);
                zip.write(bytes);
            }
        }
        return out.toByteArray();
    }
}
