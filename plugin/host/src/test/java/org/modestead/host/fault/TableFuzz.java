package org.modestead.host.fault;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.zip.GZIPOutputStream;
import org.modestead.engine.Progress;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Files of one kind that the Table Source reads, from the first cell to the last. */
final class TableFuzz implements FuzzedReader {

    private static final String CSV = """
            run,time,flow [m3/h],pressure,gate,note
            1,2020-01-01T10:00:00,1.5,4,true,"a, ""b""
            c"
            1,2020-01-01T10:00:01,-2e-3,,false,
            2,2020-01-02T10:00:00,NaN,0.25,true,\u00e9
            """;
    private static final String SEMICOLONS = "time;flow\n0;1,5\n1;-2,25\n2;3\n";
    private static final String JSON = "[{\"time\": 0, \"flow\": 1.5, \"note\": \"a\"}, {\"time\": 1, \"flow\": null, \"note\": \"\\u00e9\"}]";
    private static final String LINES = "{\"time\": 0, \"flow\": 1.5}\n{\"time\": 1, \"flow\": -2}\n";

    private final Node source = TestWorkflows.allNodes().find("table-source").orElseThrow();
    private final Path folder;
    private final String ending;
    private final byte[] parquet;

    TableFuzz(Path folder, String ending) throws IOException {
        this.folder = folder;
        this.ending = ending;
        this.parquet = ending.equals("parquet") ? parquet() : new byte[0];
    }

    /** The text above, as the Table Sink writes it. */
    private byte[] parquet() throws IOException {
        Files.write(folder.resolve("t.csv"), bytes(CSV));
        Node sink = TestWorkflows.allNodes().find("table-sink").orElseThrow();
        RunContext context = new RunContext(Progress.NONE, folder, folder);
        Object table = source.run(new NodeInputs(Map.of()), SettingsReader.read(source, Map.of("path", "t.csv")).settings().orElseThrow(), context).outputs().get("table");
        sink.run(new NodeInputs(Map.of("table", table)), SettingsReader.read(sink, Map.of("path", "sample.parquet")).settings().orElseThrow(), context);
        return Files.readAllBytes(folder.resolve("sample.parquet"));
    }

    @Override
    public String name() {
        return "tables ." + ending;
    }

    @Override
    public byte[] next(Random random) {
        Mutations mutations = new Mutations(random);
        return switch (ending) {
            case "parquet" -> mutations.bits(parquet);
            case "npy" -> random.nextBoolean() ? mutations.bits(array()) : mutations.text(array(), array());
            case "json" -> mutations.text(bytes(JSON), bytes(LINES));
            case "csv.gz" -> random.nextBoolean() ? mutations.bits(zipped(bytes(CSV))) : zipped(mutations.text(bytes(CSV), bytes(SEMICOLONS)));
            default -> random.nextBoolean() ? mutations.text(bytes(CSV), bytes(SEMICOLONS)) : mutations.text(bytes(SEMICOLONS), bytes(CSV));
        };
    }

    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private static byte[] zipped(byte[] plain) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (GZIPOutputStream zip = new GZIPOutputStream(out)) {
            zip.write(plain);
        } catch (IOException impossible) {
            throw new IllegalStateException(impossible);
        }
        return out.toByteArray();
    }

    /** Three rows of two numbers. */
    private static byte[] array() {
        byte[] header = bytes(String.format("%-117s\n", "{'descr': '<f8', 'fortran_order': False, 'shape': (3, 2), }"));
        ByteBuffer out = ByteBuffer.allocate(10 + header.length + 48).order(ByteOrder.LITTLE_ENDIAN);
        out.put((byte) 0x93).put(bytes("NUMPY")).put((byte) 1).put((byte) 0).putShort((short) header.length).put(header);
        for (int i = 0; i < 6; i++) {
            out.putDouble(0.5 * i);
        }
        return out.array();
    }

    @Override
    public boolean read(byte[] input) throws IOException {
        String file = "t." + ending;
        Files.write(folder.resolve(file), input);
        var settings = SettingsReader.read(source, Map.of("path", file)).settings().orElseThrow();
        Table table = (Table) source.run(new NodeInputs(Map.of()), settings, new RunContext(Progress.NONE, folder, folder)).outputs().get("table");
        List<String> names = table.schema().names();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                for (int j = 0; j < names.size(); j++) {
                    cursor.text(j);
                }
            }
        }
        return true;
    }
}
