package org.modestead.nodes.model;

import org.modestead.engine.modelfile.Model;
import org.modestead.nodes.words.VerdictWords;

/** How a model is told in sentences. */
final class ModelWords {

    private ModelWords() {}

    /** Returns what it is. */
    static String what(Model model) {
        int modes = model.spectrum().modes().size();
        return (model.name().isEmpty() ? "The model" : "The model \"" + model.name() + "\"") + " is a " + model.operator().method() + " of rank "
                + model.operator().rank() + " on " + model.operator().snapshots().channels().size() + " channels, with " + modes
                + (modes == 1 ? " mode." : " modes.");
    }

    /** Returns what may be said of its modes. */
    static String verdict(Model model) {
        return "Its verdict: " + VerdictWords.headline(model.verdict().overall().grade()) + ".";
    }
}
