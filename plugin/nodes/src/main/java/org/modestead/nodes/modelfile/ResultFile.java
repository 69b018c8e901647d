package org.modestead.nodes.modelfile;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.FieldsWriter;
import org.modestead.engine.modelfile.Stored;
import org.modestead.engine.modelfile.StoredSnapshots;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.figure.Figure;

/**
 * What a node showed beside its outputs, so that a host can show it again in another session.
 *
 * @param figures pictures as plain data
 * @param summary sentences
 * @param doubts what a reader of the results must know
 * @param document a report, from a node that makes one
 * @param tables the first rows of the output tables
 */
public record ResultFile(List<Figure> figures, List<String> summary, List<Doubt> doubts, Optional<ReportDocument> document,
        List<ReportDocument.Grid> tables) {

    private static final String KIND = "result";

    /** Takes immutable copies. */
    public ResultFile {
        figures = List.copyOf(figures);
        summary = List.copyOf(summary);
        doubts = List.copyOf(doubts);
        Objects.requireNonNull(document);
        tables = List.copyOf(tables);
    }

    /** Without tables. */
    public ResultFile(List<Figure> figures, List<String> summary, List<Doubt> doubts, Optional<ReportDocument> document) {
        this(figures, summary, doubts, document, List.of());
    }

    /** Returns what a result shows, with the heads of its tables. */
    public static ResultFile of(NodeDeclaration declaration, NodeResult result) {
        return new ResultFile(result.figures(), result.summary(), result.doubts(), result.document(), TableHeads.of(declaration, result.outputs()));
    }

    /** Returns what a result shows beside its tables. */
    public static ResultFile of(NodeResult result) {
        return new ResultFile(result.figures(), result.summary(), result.doubts(), result.document());
    }

    /**
     * Writes it.
     *
     * @param out not closed
     * @throws IOException if the stream fails
     */
    public static void write(ResultFile result, OutputStream out) throws IOException {
        Stored.Fields content = new FieldsWriter().list("figures", result.figures(), StoredFigure::of).texts("summary", result.summary())
                .list("doubts", result.doubts(), StoredSnapshots::of).put("document", result.document(), StoredDocument::of)
                .list("tables", result.tables(), StoredDocument::of).done();
        ModelFile.write(KIND, content, out);
    }

    /**
     * Reads it.
     *
     * @param in read to its end, not closed
     * @throws IOException if the stream fails
     * @throws org.modestead.engine.modelfile.ModelFileFault if what it gives is no such file, is broken, or of a later version
     */
    public static ResultFile read(InputStream in) throws IOException {
        return ModelFile.read(KIND, in, ResultFile::read);
    }

    private static ResultFile read(FieldsReader in) {
        return new ResultFile(in.objects("figures", StoredFigure::read), in.texts("summary"), in.objects("doubts", StoredSnapshots::readDoubt),
                in.optional("document", StoredDocument::read), in.has("tables") ? in.objects("tables", StoredDocument::grid) : List.of());
    }
}
