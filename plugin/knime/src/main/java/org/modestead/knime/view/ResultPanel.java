package org.modestead.knime.view;

import java.awt.BorderLayout;
import java.awt.Dimension;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JFileChooser;
import javax.swing.JLabel;
import javax.swing.JOptionPane;
import javax.swing.JPanel;
import javax.swing.JTabbedPane;
import javax.swing.JTextArea;
import org.modestead.knime.swing.Sheet;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.modelfile.ResultFile;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.report.HtmlReport;

/**
 * What a node found: its summary, its figures one at a time, its doubts, the first rows of its tables and, where it made one, its
 * report. Drawn from the data that the written report is drawn from. Needs no display to be made and painted.
 */
public final class ResultPanel {
    private static final Dimension SIZE = new Dimension(780, 620);

    private static final String FIGURE = "Figure";
    private static final String FIGURES = "Figures";
    private static final String TABLES = "Tables";

    private final JPanel panel = new JPanel(new BorderLayout());
    private final JTabbedPane tabs = new JTabbedPane();
    private final JComboBox<Named> chooser = new JComboBox<>();
    private final FigureCanvas canvas = new FigureCanvas();
    private final JTextArea caption = Texts.paragraph("", "Caption of the figure");

    /** A figure as the chooser names it. */
    private record Named(Figure figure) {
        @Override
        public String toString() {
            return figure.title();
        }
    }

    /** @param result what is to be shown */
    public ResultPanel(ResultFile result) {
        panel.setPreferredSize(SIZE);
        panel.add(tabs, BorderLayout.CENTER);
        tabs.getAccessibleContext().setAccessibleName("Parts of the result");
        tabs.addTab("Summary", sentences(result.summary(), "Nothing was said.", "Summary"));
        if (!result.figures().isEmpty()) {
            tabs.addTab(result.figures().size() == 1 ? FIGURE : FIGURES, figures(result.figures()));
        }
        tabs.addTab("Doubts (" + result.doubts().size() + ")", sentences(result.doubts().stream().map(doubt -> doubt.sentence()).toList(),
                "There is nothing to doubt in what was checked.", "Doubts"));
        if (!result.tables().isEmpty()) {
            tabs.addTab(TABLES, Sheet.scrolled(result.tables().stream().flatMap(table -> ReportPane.grid(table).stream()).toList()));
        }
        result.document().ifPresent(document -> tabs.addTab("Report", report(document)));
        int figures = tabs.indexOfTab(result.figures().size() == 1 ? FIGURE : FIGURES);
        tabs.setSelectedIndex(Math.max(0, result.document().isPresent() ? tabs.getTabCount() - 1 : figures >= 0 ? figures
                : tabs.indexOfTab(TABLES)));
    }

    /** Returns what is to be shown; always the same. */
    public JComponent component() {
        return panel;
    }

    private static JComponent sentences(List<String> sentences, String none, String name) {
        String text = sentences.isEmpty() ? none : sentences.stream().map(sentence -> "\u2022 " + sentence)
                .collect(Collectors.joining("\n\n"));
        return Sheet.scrolled(List.of(Texts.heading(name, true), Texts.paragraph(text, name)));
    }

    private JComponent figures(List<Figure> figures) {
        chooser.putClientProperty("html.disable", Boolean.TRUE);
        chooser.getAccessibleContext().setAccessibleName(FIGURE);
        figures.forEach(figure -> chooser.addItem(new Named(figure)));
        chooser.addActionListener(event -> show(chooser.getItemAt(chooser.getSelectedIndex()).figure()));
        JLabel label = new JLabel(FIGURE);
        label.setLabelFor(chooser);
        JButton save = new JButton("Save as SVG...");
        save.addActionListener(event -> save(chooser.getItemAt(chooser.getSelectedIndex()).figure().id() + ".svg",
                FigureRenderer.svg(chooser.getItemAt(chooser.getSelectedIndex()).figure())));
        JPanel top = new JPanel(new BorderLayout(8, 0));
        top.setBorder(BorderFactory.createEmptyBorder(6, 8, 6, 8));
        top.add(label, BorderLayout.LINE_START);
        top.add(chooser, BorderLayout.CENTER);
        top.add(save, BorderLayout.LINE_END);
        JPanel all = new JPanel(new BorderLayout());
        all.add(top, BorderLayout.PAGE_START);
        all.add(canvas, BorderLayout.CENTER);
        all.add(caption, BorderLayout.PAGE_END);
        show(figures.get(0));
        return all;
    }

    private void show(Figure figure) {
        canvas.show(figure);
        caption.setText(figure.caption());
    }

    private JComponent report(ReportDocument document) {
        JButton save = new JButton("Save as a page (HTML)...");
        save.addActionListener(event -> save("report.html", HtmlReport.write(document)));
        JPanel bottom = new JPanel(new BorderLayout());
        bottom.setBorder(BorderFactory.createEmptyBorder(6, 8, 6, 8));
        bottom.add(save, BorderLayout.LINE_END);
        JPanel all = new JPanel(new BorderLayout());
        all.add(ReportPane.of(document), BorderLayout.CENTER);
        all.add(bottom, BorderLayout.PAGE_END);
        return all;
    }

    private void save(String name, String text) {
        JFileChooser files = new JFileChooser();
        files.setSelectedFile(new File(name.toLowerCase(Locale.ROOT)));
        if (files.showSaveDialog(panel) == JFileChooser.APPROVE_OPTION) {
            Path file = files.getSelectedFile().toPath();
            boolean write = !Files.exists(file) || JOptionPane.showConfirmDialog(panel, file.getFileName()
                    + " is there already. Replace it?", "Save", JOptionPane.OK_CANCEL_OPTION) == JOptionPane.OK_OPTION;
            if (write) {
                write(file, text);
            }
        }
    }

    private void write(Path file, String text) {
        try {
            Files.writeString(file, text);
        } catch (IOException failed) {
            JOptionPane.showMessageDialog(panel, file + " could not be written (" + failed.getMessage() + "); choose another place.",
                    "Save", JOptionPane.ERROR_MESSAGE);
        }
    }

    /** Returns the tabs, for tests in this package. */
    JTabbedPane tabs() {
        return tabs;
    }

    JComboBox<?> chooser() {
        return chooser;
    }

    FigureCanvas canvas() {
        return canvas;
    }
}
