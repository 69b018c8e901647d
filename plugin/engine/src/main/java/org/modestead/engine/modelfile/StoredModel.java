package org.modestead.engine.modelfile;

/** A model: its parts, each as it stands in a file of its own. */
public final class StoredModel {

    private StoredModel() {}

    /** Returns the tree of a model. */
    public static Stored.Fields of(Model model) {
        return new FieldsWriter().text("name", model.name()).text("notes", model.notes()).put("operator", StoredOperator.of(model.operator()))
                .put("spectrum", StoredSpectrum.of(model.spectrum())).put("verdict", StoredVerdict.of(model.verdict())).done();
    }

    /** Returns the model of a tree. */
    public static Model read(FieldsReader in) {
        return new Model(in.text("name"), in.text("notes"), in.object("operator", StoredOperator::read),
                in.object("spectrum", StoredSpectrum::read), in.object("verdict", StoredVerdict::read));
    }
}
