package org.modestead.nodes.modelfile;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.nodes.contract.PortType;

/** Every file that is not as it should be is refused with one sentence. */
class BrokenFilesTest {

    private static final byte[] WHOLE = PortFilesTest.written(PortType.SNAPSHOTS, StoredFits.LINEAR.snapshots());

    private static Map<String, byte[]> entries() throws IOException {
        Map<String, byte[]> out = new LinkedHashMap<>();
        try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(WHOLE))) {
            for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                out.put(entry.getName(), zip.readAllBytes());
            }
        }
        return out;
    }

    /** As other programs write a zip: deflated, sizes after the data. */
    private static byte[] zipped(Map<String, byte[]> entries) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (ZipOutputStream zip = new ZipOutputStream(out)) {
            for (Map.Entry<String, byte[]> entry : entries.entrySet()) {
                zip.putNextEntry(new ZipEntry(entry.getKey()));
                zip.write(entry.getValue());
            }
        }
        return out.toByteArray();
    }

    private static byte[] withIndex(String from, String to) throws IOException {
        Map<String, byte[]> entries = entries();
        String index = new String(entries.get("model.json"), StandardCharsets.US_ASCII);
        assertTrue(index.contains(from), index);
        entries.put("model.json", index.replace(from, to).getBytes(StandardCharsets.US_ASCII));
        return zipped(entries);
    }

    private static ModelFileFault refused(byte[] bytes) {
        return assertThrows(ModelFileFault.class, () -> PortFiles.read(PortType.SNAPSHOTS, new ByteArrayInputStream(bytes)));
    }

    private static void refusedWith(String seen, byte[] bytes) {
        ModelFileFault fault = refused(bytes);
        assertTrue(fault.getMessage().contains(seen), fault.getMessage());
    }

    @Test
    void theIndexTellsFormatVersionKindAndRelease() throws IOException {
        String index = new String(entries().get("model.json"), StandardCharsets.US_ASCII);
        assertTrue(Pattern.compile("^\\{\n  \"format\" : \"modestead-model\",\n  \"version\" : 1,\n  \"kind\" : \"snapshots\",\n"
                + "  \"written_by\" : \"Modestead [0-9.]+(-SNAPSHOT)?\",\n  \"content\" : \\{").matcher(index).find(), index);
    }

    @Test
    void aFileZippedAnewIsRead() throws IOException {
        assertArrayEquals(WHOLE, PortFilesTest.written(PortType.SNAPSHOTS, PortFilesTest.read(PortType.SNAPSHOTS, zipped(entries()))));
    }

    @Test
    void nothingAndSomethingElseAreRefused() {
        refusedWith("it is no zip file", new byte[0]);
        refusedWith("it is no zip file", "run;time;x\n".getBytes(StandardCharsets.US_ASCII));
    }

    @Test
    void aFileCutAnywhereIsRefused() {
        for (int length = 0; length < WHOLE.length; length += 97) {
            refused(Arrays.copyOf(WHOLE, length));
        }
        refusedWith("its end is missing", Arrays.copyOf(WHOLE, WHOLE.length - 1));
    }

    @Test
    void anotherKindOfValueIsRefused() {
        ModelFileFault fault = assertThrows(ModelFileFault.class, () -> PortFiles.read(PortType.OPERATOR, new ByteArrayInputStream(WHOLE)));
        assertEquals("model file: it holds a value of kind snapshots; take one that holds a value of kind operator.", fault.getMessage());
    }

    @Test
    void anOlderOrNewerVersionIsRefusedAndNamed() throws IOException {
        assertEquals("model file: it has version 2 of the format; open it with a newer Modestead, this one reads version 1.",
                refused(withIndex("\"version\" : 1", "\"version\" : 2")).getMessage());
        refusedWith("it has version 0", withIndex("\"version\" : 1", "\"version\" : 0"));
        refusedWith("the format other", withIndex("\"modestead-model\"", "\"other\""));
    }

    @Test
    void entriesMissingAddedTwiceOrOfOtherShapeAreRefused() throws IOException {
        Map<String, byte[]> entries = entries();
        byte[] times = entries.remove("training/times.npy");
        refusedWith("the entry training/times.npy is missing", zipped(entries));
        entries.put("training/times.npy", Arrays.copyOf(times, times.length - 8));
        refusedWith("an array ends early", zipped(entries));
        entries.put("training/times.npy", Arrays.copyOf(times, times.length + 8));
        refusedWith("it is longer than its shape", zipped(entries));
        entries.put("training/times.npy", entries.get("training/values.npy"));
        refusedWith("its header is not that of an array of type <f8 and shape", zipped(entries));
        times[times.length - 1] ^= 1;
        entries.put("training/times.npy", times);
        refusedWith("its checksum is another one", zipped(entries));
        entries = entries();
        entries.put("../../outside.npy", times);
        refusedWith("an entry that model.json does not name", zipped(entries));
    }

    @Test
    void theIndexMustComeFirst() throws IOException {
        Map<String, byte[]> entries = new LinkedHashMap<>(Map.of("other.txt", new byte[1]));
        entries.putAll(entries());
        refusedWith("its first entry is other.txt", zipped(entries));
    }

    /** A few bytes that unfold to very many: refused before they are unfolded. */
    @Test
    void arraysLargerThanMemoryAreRefusedUnread() throws IOException {
        Map<String, byte[]> entries = entries();
        String index = new String(entries.get("model.json"), StandardCharsets.US_ASCII);
        String huge = index.replaceFirst("\"shape\" : \\[ [0-9]+ \\]", "\"shape\" : [ 2147483639 ]")
                .replaceFirst("\"shape\" : \\[ ([0-9]+), 2 \\]", "\"shape\" : [ 2147483639, 536870911 ]");
        entries.put("model.json", huge.getBytes(StandardCharsets.US_ASCII));
        refused(zipped(entries));
        refusedWith("MB of numbers", withLongOffset(2_000_000_000));
    }

    private static byte[] withLongOffset(int length) throws IOException {
        Map<String, byte[]> entries = entries();
        String index = new String(entries.get("model.json"), StandardCharsets.US_ASCII);
        int array = index.indexOf("\"preparation/offset.npy\"");
        int shape = index.indexOf("[ 2 ]", array);
        entries.put("model.json", (index.substring(0, shape) + "[ " + length + " ]" + index.substring(shape + 5)).getBytes(StandardCharsets.US_ASCII));
        return zipped(entries);
    }

    /** Ten thousand times the largest index, deflated to a few kilobytes, streams through without being kept. */
    @Test
    void anIndexWithoutEndIsRefused() throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (ZipOutputStream zip = new ZipOutputStream(out)) {
            zip.putNextEntry(new ZipEntry("model.json"));
            byte[] blanks = new byte[1 << 20];
            Arrays.fill(blanks, (byte) ' ');
            for (int i = 0; i < 65; i++) {
                zip.write(blanks);
            }
        }
        refusedWith("is longer than", out.toByteArray());
    }

    @Test
    void anIndexThatIsNestedTooDeepOrNotAsExpectedIsRefused() throws IOException {
        refusedWith("it is not the JSON that is expected", withIndex("\"facts\" : [", "\"facts\" : " + "[".repeat(100_000)));
        refusedWith("it is not the JSON that is expected", withIndex("\"facts\" : [", "\"facts\" : " + "{\"a\":".repeat(100_000)));
        refusedWith("it is not the JSON that is expected", withIndex("\"facts\" : [", "\"facts\" : [ null, "));
        refusedWith("it is not the JSON that is expected", withIndex("\"kind\" : \"snapshots\"", "\"kind\" : \"snapshots\", \"kind\" : \"snapshots\""));
        refusedWith("it is not the JSON that is expected", withIndex("\"depth\" : 3", "\"depth\" : 1" + "0".repeat(400)));
    }

    @Test
    void fieldsThatAreMissingOrWrongAreNamedByPlace() throws IOException {
        assertEquals("model file.content.delay.depth: the number 0; a whole number from 1 to 32767 is expected there.",
                refused(withIndex("\"depth\" : 3", "\"depth\" : 0")).getMessage());
        assertEquals("model file.content.delay: the field depth is missing; the file must be whole and of a version that is known here.",
                refused(withIndex("\"depth\" : 3", "\"deep\" : 3")).getMessage());
        refusedWith("content.time.kind: the text \"clock\"; one of number, date, date-time", withIndex("\"kind\" : \"number\"", "\"kind\" : \"clock\""));
        refusedWith("content.channels[0].name: the number 7", withIndex("\"name\" : \"x\"", "\"name\" : 7"));
        refusedWith("a channel needs a name", withIndex("\"name\" : \"x\"", "\"name\" : \"\""));
    }

    @Test
    void aStreamThatFailsIsNoFaultOfTheFile() {
        InputStream failing = new InputStream() {
            private int at;

            @Override
            public int read() throws IOException {
                if (at > 5000) {
                    throw new IOException("the disk is gone");
                }
                return WHOLE[at++] & 0xff;
            }
        };
        assertEquals("the disk is gone", assertThrows(IOException.class, () -> PortFiles.read(PortType.SNAPSHOTS, failing)).getMessage());
    }

    @Test
    void aKernelOfAnExtensionThatIsNotThereIsNamed() throws IOException {
        byte[] bytes = PortFilesTest.written(PortType.KERNEL, StoredFits.WEIGHTED_SECTIONS.kernel(StoredFits.WEIGHTED_SECTIONS.snapshots()));
        String changed = new String(bytes, StandardCharsets.ISO_8859_1);
        Map<String, byte[]> index = new LinkedHashMap<>();
        try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(bytes))) {
            index.put(zip.getNextEntry().getName(), new String(zip.readAllBytes(), StandardCharsets.US_ASCII).replace("gaussian", "rational")
                    .getBytes(StandardCharsets.US_ASCII));
        }
        assertTrue(changed.contains("gaussian"));
        ModelFileFault fault = assertThrows(ModelFileFault.class,
                () -> PortFiles.read(PortType.KERNEL, new ByteArrayInputStream(zipped(index))));
        assertEquals("model file.content: the kernel family rational is not known here; install the extension that brings it.", fault.getMessage());
    }
}
