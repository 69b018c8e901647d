package org.modestead.nodes.document;

import java.util.List;
import java.util.Objects;
import org.modestead.nodes.figure.Figure;

/**
 * A report as plain data: what a person is to read, in order, without a word about how it looks. Writers turn it into
 * a file; every text in it is plain text and is escaped by the writer.
 *
 * @param title of the whole
 * @param subtitle one line under the title, may be empty
 * @param sections in reading order
 */
public record ReportDocument(String title, String subtitle, List<Section> sections) {

    /** Takes an immutable copy. */
    public ReportDocument {
        Objects.requireNonNull(title);
        Objects.requireNonNull(subtitle);
        sections = List.copyOf(sections);
    }

    /**
     * A part of the report under one heading.
     *
     * @param id unique in the document, lower case with dashes; an anchor
     * @param heading one line
     * @param blocks in reading order
     */
    public record Section(String id, String heading, List<Block> blocks) {

        /** Takes an immutable copy. */
        public Section {
            Objects.requireNonNull(id);
            Objects.requireNonNull(heading);
            blocks = List.copyOf(blocks);
        }
    }

    /** What a section is made of. */
    public sealed interface Block {}

    /** A heading below that of the section. */
    public record Heading(String text) implements Block {}

    /** Running text. */
    public record Paragraph(String text) implements Block {}

    /** Points of equal rank. */
    public record Points(List<String> items) implements Block {

        /** Takes an immutable copy. */
        public Points {
            items = List.copyOf(items);
        }
    }

    /**
     * Text that must not be overlooked.
     *
     * @param tone how much it weighs; also told by a word, never by colour alone
     * @param title a few words, for example {@code The modes stand}
     * @param sentences each a paragraph
     */
    public record Callout(Tone tone, String title, List<String> sentences) implements Block {

        /** Takes an immutable copy. */
        public Callout {
            Objects.requireNonNull(tone);
            sentences = List.copyOf(sentences);
        }
    }

    /** How much a callout weighs. */
    public enum Tone {
        /** May be relied on as said. */
        FIRM("Finding"),
        /** Something to know. */
        NOTE("Note"),
        /** Something that limits what may be done. */
        CAUTION("Caution"),
        /** Something that forbids a use. */
        STOP("Stop");

        private final String word;

        Tone(String word) {
            this.word = word;
        }

        /** Returns the word that tells the tone. */
        public String word() {
            return word;
        }
    }

    /**
     * Names with a value each, for example data facts or settings.
     *
     * @param caption what is listed
     * @param entries in order
     */
    public record KeyValues(String caption, List<Entry> entries) implements Block {

        /** Takes an immutable copy. */
        public KeyValues {
            entries = List.copyOf(entries);
        }
    }

    /** One line of a {@link KeyValues}. */
    public record Entry(String name, String value) {}

    /**
     * Rows and columns of texts.
     *
     * @param caption what the table shows, not empty
     * @param columns heads, in order
     * @param rows each as long as {@code columns}
     * @param note below the table, for example how many rows were left out; may be empty
     */
    public record Grid(String caption, List<Head> columns, List<List<String>> rows, String note) implements Block {

        /** Takes immutable copies and checks the width of every row. */
        public Grid {
            columns = List.copyOf(columns);
            rows = rows.stream().map(List::copyOf).toList();
            for (List<String> row : rows) {
                if (row.size() != columns.size()) {
                    throw new IllegalArgumentException("a row of table '" + caption + "' has " + row.size()
                            + " cells, the table "
                            + columns.size() + " columns");
                }
            }
        }
    }

    /**
     * Head of a column.
     *
     * @param text with unit in brackets
     * @param numeric whether the cells are figures, to be aligned at the right
     */
    public record Head(String text, boolean numeric) {}

    /** A picture; its caption is also the text alternative. */
    public record Picture(Figure figure) implements Block {}
}
