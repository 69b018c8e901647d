package org.modestead.nodes.contract;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.figure.Figure;

/**
 * What a node gives back.
 *
 * @param outputs value of every output port by id
 * @param figures pictures as plain data
 * @param summary a few sentences in plain words for the report and the node's tooltip
 * @param doubts what a reader of the results must know
 * @param document a report that the node made for people; the host writes it, none for most nodes
 */
public record NodeResult(Map<String, Object> outputs, List<Figure> figures, List<String> summary, List<Doubt> doubts,
        Optional<ReportDocument> document) {

    /** Takes immutable copies. */
    public NodeResult {
        outputs = Map.copyOf(outputs);
        figures = List.copyOf(figures);
        summary = List.copyOf(summary);
        doubts = List.copyOf(doubts);
        Objects.requireNonNull(document);
    }

    /** A result without a report. */
    public NodeResult(Map<String, Object> outputs, List<Figure> figures, List<String> summary, List<Doubt> doubts) {
        this(outputs, figures, summary, doubts, Optional.empty());
    }
}
