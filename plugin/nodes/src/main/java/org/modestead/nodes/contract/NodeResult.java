package org.modestead.nodes.contract;

import java.util.List;
import java.util.Map;
import org.modestead.engine.Doubt;
import org.modestead.nodes.figure.Figure;

/**
 * What a node gives back.
 *
 * @param outputs value of every output port by id
 * @param figures pictures as plain data
 * @param summary a few sentences in plain words for the report and the node's tooltip
 * @param doubts what a reader of the results must know
 */
public record NodeResult(Map<String, Object> outputs, List<Figure> figures, List<String> summary, List<Doubt> doubts) {

    /** Takes immutable copies. */
    public NodeResult {
        outputs = Map.copyOf(outputs);
        figures = List.copyOf(figures);
        summary = List.copyOf(summary);
        doubts = List.copyOf(doubts);
    }
}
