package org.modestead.knime.dialog;

import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;

/** What shows one setting and lets a person change it. Made once, filled again whenever the dialog is opened. */
interface Editor {

    /** Hears of what a person did. */
    interface Edits {

        /**
         * Takes a new raw value.
         *
         * @param key of the setting, or of the rule of a list of columns
         * @param value as typed, perhaps wrong; empty for not set
         */
        void edited(String key, Optional<Object> value);
    }

    /** Returns what is laid out. */
    JComponent component();

    /** Returns the parts that take the keyboard, in order, at least one. */
    List<JComponent> parts();

    /** Shows what a draft holds, right or wrong. Tells nobody of it. */
    void show(Draft draft);

    /** Follows a change elsewhere in the draft, without touching what a person is typing here. */
    default void follow(Draft draft) {
        // most fields stand alone
    }

    /** Allows or forbids changes. */
    void allow(boolean allowed);
}
