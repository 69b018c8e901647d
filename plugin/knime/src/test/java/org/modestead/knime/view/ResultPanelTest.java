package org.modestead.knime.view;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Dimension;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageIO;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JTable;
import javax.swing.text.JTextComponent;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Doubt;
import org.modestead.knime.testing.Bench;
import org.modestead.knime.testing.Painted;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.modelfile.PortFact;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.modelfile.ResultFile;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.table.Table;

/** Views show what the node said and the figures of the report, in any size, without a display. */
class ResultPanelTest {
    @TempDir
    static Path folder;
    private static Bench bench;

    @BeforeAll
    static void run() {
        bench = Bench.pumpHouse(folder);
    }

    @Test
    void everyResultIsShownWhole() {
        bench.results().forEach((id, result) -> {
            ResultPanel view = new ResultPanel(shown(id));
            Painted.image(Painted.laidOut(view.component(), new Dimension(780, 620)));
            String texts = texts(view.component());
            result.summary().forEach(sentence -> assertTrue(texts.contains(sentence), id + ": " + sentence));
            result.doubts().forEach(doubt -> assertTrue(texts.contains(doubt.sentence()), id + ": " + doubt));
            assertEquals(result.figures().size(), view.chooser().getItemCount(), id);
            assertEquals(result.document().isPresent(), titles(view).contains("Report"), id);
            assertEquals(result.outputs().values().stream().anyMatch(Table.class::isInstance), titles(view).contains("Tables"), id);
        });
        assertTrue(bench.results().values().stream().mapToInt(result -> result.figures().size()).sum() > 12, "figures were looked at");
    }

    /** Pixel for pixel the picture that {@link FigureRenderer} writes into files. */
    @Test
    void figuresAreThoseOfTheReport() throws IOException {
        List<Figure> figures = bench.results().get("wellposedness-checker").figures();
        ResultPanel view = new ResultPanel(shown("wellposedness-checker"));
        for (int i = 0; i < figures.size(); i++) {
            view.chooser().setSelectedIndex(i);
            FigureCanvas canvas = view.canvas();
            canvas.setSize(canvas.getPreferredSize());
            BufferedImage image = new BufferedImage(canvas.getWidth(), canvas.getHeight(), BufferedImage.TYPE_INT_RGB);
            Graphics2D graphics = image.createGraphics();
            canvas.paint(graphics);
            graphics.dispose();
            BufferedImage file = ImageIO.read(new ByteArrayInputStream(FigureRenderer.png(figures.get(i), 1)));
            assertTrue(Arrays.equals(pixels(file), pixels(image)), figures.get(i).id());
            assertEquals(figures.get(i).title(), canvas.getAccessibleContext().getAccessibleName());
            assertEquals(figures.get(i).caption(), canvas.getAccessibleContext().getAccessibleDescription());
        }
    }

    @Test
    void aFigureFillsTheWindowAndKeepsItsProportions() {
        ResultPanel view = new ResultPanel(shown("spectrum-extractor"));
        Painted.laidOut(view.component(), new Dimension(500, 420));
        double small = view.canvas().scale();
        Painted.laidOut(view.component(), new Dimension(1400, 1000));
        assertTrue(view.canvas().scale() > 1.5 * small, small + " and " + view.canvas().scale());
        double used = Math.max(view.canvas().scale() * view.canvas().getPreferredSize().width / view.canvas().getWidth(),
                view.canvas().scale() * view.canvas().getPreferredSize().height / view.canvas().getHeight());
        assertEquals(1, used, 1e-12);
    }

    @Test
    void aResultWithoutFiguresOrWordsIsShownToo() {
        ResultPanel view = new ResultPanel(new ResultFile(List.of(), List.of(), List.of(new Doubt("d", "<html>A doubt.")),
                Optional.empty()));
        Painted.image(Painted.laidOut(view.component(), new Dimension(780, 620)));
        assertEquals(List.of("Summary", "Doubts (1)"), titles(view));
        assertTrue(texts(view.component()).contains("Nothing was said."));
    }

    @Test
    void everythingCanBeReachedAndIsNamed() {
        ResultPanel view = new ResultPanel(shown("mode-report"));
        for (int tab = 0; tab < view.tabs().getTabCount(); tab++) {
            view.tabs().setSelectedIndex(tab);
            Painted.laidOut(view.component(), new Dimension(780, 620));
            Painted.shown(view.component()).stream().filter(part -> part instanceof JTextComponent || part instanceof JTable
                    || part instanceof FigureCanvas).forEach(part -> {
                        String name = ((JComponent) part).getAccessibleContext().getAccessibleName();
                        assertFalse(name == null || name.isBlank(), part.toString());
                        assertTrue(part.isFocusable());
                    });
        }
    }

    @Test
    void everyPortTellsItsFacts() {
        for (String port : List.of("snapshot-builder.snapshots", "kernel-chooser.kernel", "operator-fitter.operator",
                "spectrum-extractor.spectrum",
                "wellposedness-checker.verdict")) {
            PortType type = List.of(PortType.values()).stream().filter(known -> known.valueClass().isInstance(bench.value(port)))
                    .findFirst().orElseThrow();
            List<PortFact> facts = PortFiles.describe(type, bench.value(port));
            JComponent view = PortPanel.of(type.title(), facts);
            Painted.image(Painted.laidOut(view, new Dimension(600, 400)));
            assertNotEquals(0, facts.size());
            assertEquals(facts, Painted.shown(view).stream().filter(JTextComponent.class::isInstance).map(JTextComponent.class::cast)
                    .map(text -> new PortFact(text.getAccessibleContext().getAccessibleName(), text.getText())).toList());
        }
    }

    private static ResultFile shown(String id) {
        return bench.shown(id);
    }

    private static List<String> titles(ResultPanel view) {
        List<String> titles = new ArrayList<>();
        for (int tab = 0; tab < view.tabs().getTabCount(); tab++) {
            titles.add(view.tabs().getTitleAt(tab));
        }
        return titles;
    }

    private static String texts(JComponent component) {
        StringBuilder texts = new StringBuilder();
        collect(component, texts);
        return texts.toString();
    }

    private static void collect(java.awt.Container component, StringBuilder into) {
        if (component instanceof JTextComponent text) {
            into.append(text.getText()).append('\n');
        } else if (component instanceof JLabel label) {
            into.append(label.getText()).append('\n');
        }
        for (java.awt.Component child : component.getComponents()) {
            if (child instanceof java.awt.Container container) {
                collect(container, into);
            }
        }
    }

    private static int[] pixels(BufferedImage image) {
        return image.getRGB(0, 0, image.getWidth(), image.getHeight(), null, 0, image.getWidth());
    }
}
