package org.modestead.knime.pictures;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Dimension;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import javax.swing.JComponent;
import javax.swing.LookAndFeel;
import javax.swing.UIManager;
import javax.swing.UnsupportedLookAndFeelException;
import javax.swing.plaf.nimbus.NimbusLookAndFeel;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.knime.dialog.SettingsForm;
import org.modestead.knime.testing.Bench;
import org.modestead.knime.testing.Painted;
import org.modestead.knime.view.PortPanel;
import org.modestead.knime.view.ResultPanel;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * Paints every dialog and every view, for the README. The pictures that are kept are compared in name and size, not in their pixels,
 * which depend on the fonts of the machine; {@code -Dpictures=write} writes them anew.
 */
class PicturesTest {
    private static final Path KEPT = Path.of("pictures");
    private static final Dimension DIALOG = new Dimension(740, 500);
    private static final Dimension VIEW = new Dimension(760, 560);
    private static final Dimension PORT = new Dimension(620, 300);

    @TempDir
    static Path folder;
    private static Bench bench;
    private static LookAndFeel before;

    @BeforeAll
    static void run() throws UnsupportedLookAndFeelException {
        before = UIManager.getLookAndFeel();
        UIManager.setLookAndFeel(new NimbusLookAndFeel());
        bench = Bench.pumpHouse(folder);
    }

    @AfterAll
    static void back() throws UnsupportedLookAndFeelException {
        UIManager.setLookAndFeel(before);
    }

    @Test
    void everyDialogAndViewIsPictured() throws IOException {
        Map<String, BufferedImage> painted = new LinkedHashMap<>();
        for (Node node : NodeCatalog.load(List.of(Node.class.getClassLoader())).nodes()) {
            String id = node.declaration().id();
            if (!node.declaration().settings().isEmpty()) {
                painted.put("dialog-" + id, painted(dialog(node, bench.settings().get(id)), DIALOG));
            }
            painted.put("view-" + id, painted(new ResultPanel(bench.shown(id)).component(), VIEW));
            assertTrue(bench.results().containsKey(id), id);
        }
        painted.put("dialog-snapshot-builder-wrong", painted(wrong(), DIALOG));
        ports().forEach((name, port) -> painted.put("port-" + name, painted(port, PORT)));
        painted.forEach((name, image) -> assertTrue(colours(image) > 8, name + " is blank"));
        if ("write".equals(System.getProperty("pictures"))) {
            write(painted);
        }
        assertEquals(new TreeSet<>(painted.keySet()), kept(), "write them anew with -Dpictures=write");
        for (Map.Entry<String, BufferedImage> picture : painted.entrySet()) {
            BufferedImage file = ImageIO.read(KEPT.resolve(picture.getKey() + ".png").toFile());
            assertEquals(size(picture.getValue()), size(file), picture.getKey());
            assertTrue(colours(file) > 8, picture.getKey());
        }
    }

    /** Every kept picture is in the README, with a text for those who cannot see it, and no other is asked for. */
    @Test
    void theReadmeShowsEveryPicture() throws IOException {
        String readme = Files.readString(Path.of("..", "..", "README.md"));
        TreeSet<String> shown = Pattern.compile("<img src=\"plugin/knime/pictures/([a-z-]+)\\.png\" width=\"\\d+\" alt=\"[^\"]{10,}\">")
                .matcher(readme).results().map(match -> match.group(1)).collect(Collectors.toCollection(TreeSet::new));
        assertEquals(kept(), shown);
    }

    private static JComponent dialog(Node node, Map<String, Object> stored) {
        SettingsForm form = new SettingsForm(node);
        JComponent component = form.component();
        form.load(stored, inputs(node));
        assertEquals(List.of(), form.problems(), node.declaration().id());
        return component;
    }

    private static JComponent wrong() {
        Node node = NodeCatalog.load(List.of(Node.class.getClassLoader())).find("snapshot-builder").orElseThrow();
        SettingsForm form = new SettingsForm(node);
        JComponent component = form.component();
        form.load(Map.of("time-column", "tme", "run-column", "run", "gap-factor", 0.5, "channels-by", "wildcard *_vibration"),
                inputs(node));
        return component;
    }

    private static Map<String, TableSchema> inputs(Node node) {
        TableSchema recordings = ((Table) bench.value("signal-generator.table")).schema();
        return node.declaration().inputs().stream().filter(port -> port.type() == PortType.TABLE)
                .collect(Collectors.toMap(port -> port.id(), port -> recordings));
    }

    private static Map<String, JComponent> ports() {
        Map<String, JComponent> ports = new LinkedHashMap<>();
        for (String from : List.of("snapshot-builder.snapshots", "kernel-chooser.kernel", "operator-fitter.operator",
                "spectrum-extractor.spectrum", "wellposedness-checker.verdict", "model-reader.model")) {
            Object value = bench.value(from);
            PortType type = Stream.of(PortType.values()).filter(known -> known.valueClass().isInstance(value)).findFirst().orElseThrow();
            ports.put(from.substring(from.indexOf('.') + 1), PortPanel.of(type.title(), PortFiles.describe(type, value)));
        }
        return ports;
    }

    private static BufferedImage painted(JComponent component, Dimension size) {
        return Painted.image(Painted.laidOut(component, size));
    }

    private static void write(Map<String, BufferedImage> painted) throws IOException {
        Files.createDirectories(KEPT);
        for (String name : kept()) {
            Files.delete(KEPT.resolve(name + ".png"));
        }
        for (Map.Entry<String, BufferedImage> picture : painted.entrySet()) {
            PictureFile.write(picture.getValue(), KEPT.resolve(picture.getKey() + ".png"));
        }
    }

    private static TreeSet<String> kept() throws IOException {
        try (Stream<Path> files = Files.list(KEPT)) {
            return files.map(file -> file.getFileName().toString().replaceFirst("\\.png$", ""))
                    .collect(Collectors.toCollection(TreeSet::new));
        }
    }

    private static Dimension size(BufferedImage image) {
        return new Dimension(image.getWidth(), image.getHeight());
    }

    private static long colours(BufferedImage image) {
        return Arrays.stream(image.getRGB(0, 0, image.getWidth(), image.getHeight(), null, 0, image.getWidth())).distinct().count();
    }
}
