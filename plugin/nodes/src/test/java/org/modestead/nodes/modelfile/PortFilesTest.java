package org.modestead.nodes.modelfile;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.testing.Steps;

/** A value read back from its file computes what the value itself computes, bit for bit. */
class PortFilesTest {

    static byte[] written(PortType type, Object value) {
        try {
            ByteArrayOutputStream out = new ByteArrayOutputStream();
            PortFiles.write(type, value, out);
            return out.toByteArray();
        } catch (IOException impossible) {
            throw new UncheckedIOException(impossible);
        }
    }

    static Object read(PortType type, byte[] bytes) {
        try {
            return PortFiles.read(type, new ByteArrayInputStream(bytes));
        } catch (IOException impossible) {
            throw new UncheckedIOException(impossible);
        }
    }

    /** The file of the value read back holds the same bytes, so every number in it has the same bits. */
    private static Object again(PortType type, Object value) {
        byte[] bytes = written(type, value);
        Object out = read(type, bytes);
        assertArrayEquals(bytes, written(type, out), type.title());
        assertEquals(PortFiles.describe(type, value), PortFiles.describe(type, out));
        assertTrue(!PortFiles.describe(type, value).isEmpty());
        return out;
    }

    @ParameterizedTest
    @EnumSource(StoredFits.class)
    void whatFollowsFromAReloadedValueIsTheSame(StoredFits fit) {
        Object snapshots = fit.snapshots();
        Object operator = fit.operator(snapshots).outputs().get("operator");
        List<Object> kernels = fit.usesKernel() ? List.of(fit.kernel(snapshots), again(PortType.KERNEL, fit.kernel(snapshots))) : List.of();
        assertEquals(results(snapshots, operator, kernels.stream().limit(1).toList(), false),
                results(again(PortType.SNAPSHOTS, snapshots), again(PortType.OPERATOR, operator), kernels.stream().skip(1).toList(), true));
    }

    /** Everything that nodes print downstream, and the files of what they hand on. */
    private static List<Object> results(Object snapshots, Object operator, List<Object> kernel, boolean reloading) {
        List<Object> out = new ArrayList<>();
        NodeResult extracted = Steps.run("spectrum-extractor", Map.of("operator", operator), Map.of("replicates", 20));
        add(out, extracted);
        Object spectrum = extracted.outputs().get("spectrum");
        out.add(HexFile.of(PortType.SPECTRUM, spectrum));
        spectrum = reloading ? again(PortType.SPECTRUM, spectrum) : spectrum;
        Map<String, Object> inputs = new HashMap<>(Map.of("snapshots", snapshots, "operator", operator, "spectrum", spectrum));
        NodeResult judged = Steps.run("wellposedness-checker", inputs, Map.of());
        add(out, judged);
        Object verdict = judged.outputs().get("verdict");
        out.add(HexFile.of(PortType.VERDICT, verdict));
        inputs.put("verdict", reloading ? again(PortType.VERDICT, verdict) : verdict);
        for (String route : List.of("modal", "projection")) {
            add(out, Steps.run("forecast", inputs, Map.of("horizon", 0.5, "route", route)));
        }
        Map<String, Object> refit = new HashMap<>(Map.of("snapshots", snapshots));
        if (kernel.isEmpty()) {
            add(out, Steps.run("operator-fitter", refit, Map.of()));
        } else {
            refit.put("kernel", kernel.get(0));
            add(out, Steps.run("operator-fitter", refit, Map.of("estimator", "kernel-step", "inputs", "leave-in")));
        }
        return out;
    }

    private static void add(List<Object> out, NodeResult result) {
        result.outputs().entrySet().stream().filter(output -> output.getValue() instanceof Table).sorted(Map.Entry.comparingByKey())
                .forEach(output -> out.add(Steps.texts((Table) output.getValue())));
        out.add(result.summary());
        out.add(result.doubts());
    }

    /** A file that says in what it differs. */
    private record HexFile(List<String> lines) {
        static HexFile of(PortType type, Object value) {
            String hex = HexFormat.of().formatHex(written(type, value));
            List<String> lines = new ArrayList<>();
            for (int from = 0; from < hex.length(); from += 64) {
                lines.add(hex.substring(from, Math.min(hex.length(), from + 64)));
            }
            return new HexFile(lines);
        }
    }
}
