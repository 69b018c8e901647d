package org.modestead.nodes.contract;

import java.util.List;

/**
 * Everything a host must know of a node to offer it, without running it.
 *
 * @param id stable name in workflow files, lower case with dashes, for example {@code snapshot-builder}
 * @param title name for people, Title Case, one to three words
 * @param stage which part of the work it belongs to; hosts group by it
 * @param purpose one sentence: what it does
 * @param description a few paragraphs (plain text, blank line between them): what it computes with the formula in
 *     words, when to use it and when not, cost in time and memory
 * @param references papers behind it, author, title, place, year
 * @param keywords synonyms people search for
 * @param inputs in order
 * @param outputs in order
 * @param settings in dialog order
 * @param settingsVersion raised when the meaning of stored settings changes; see {@link Node#upgrade}
 */
public record NodeDeclaration(
        String id,
        String title,
        Stage stage,
        String purpose,
        String description,
        List<String> references,
        List<String> keywords,
        List<Port> inputs,
        List<Port> outputs,
        List<Setting> settings,
        int settingsVersion) {

    /** Parts of the work, in the order in which an analyst goes through them. */
    public enum Stage {
        /** Bring tables in. */
        DATA("Data"),
        /** Turn tables into snapshots. */
        PREPARE("Prepare"),
        /** Choose the function space and fit the operator. */
        FIT("Fit"),
        /** Extract modes and decide whether they exist. */
        JUDGE("Judge"),
        /** Reconstruct and forecast. */
        FORECAST("Forecast"),
        /** Hand on. */
        REPORT("Report");

        private final String title;

        Stage(String title) {
            this.title = title;
        }

        /** Returns the name for people. */
        public String title() {
            return title;
        }
    }

    /** Takes immutable copies. */
    public NodeDeclaration {
        references = List.copyOf(references);
        keywords = List.copyOf(keywords);
        inputs = List.copyOf(inputs);
        outputs = List.copyOf(outputs);
        settings = List.copyOf(settings);
    }
}
