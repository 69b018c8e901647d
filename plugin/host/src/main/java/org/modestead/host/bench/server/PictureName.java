package org.modestead.host.bench.server;

import java.util.Locale;

/**
 * What is asked for of a picture: its data, or a file of it.
 *
 * @param id of the picture
 * @param form that is wanted
 * @param whole name as it was asked for
 */
record PictureName(String id, Form form, String whole) {

    /** What can be asked for. */
    enum Form { DATA, SVG, PNG, CSV }

    /** Reads a name: the id, with the ending of a file where one is wanted. */
    static PictureName read(String name) {
        for (Form form : Form.values()) {
            String end = "." + form.name().toLowerCase(Locale.ROOT);
            if (form != Form.DATA && name.endsWith(end)) {
                return new PictureName(name.substring(0, name.length() - end.length()), form, name);
            }
        }
        return new PictureName(name, Form.DATA, name);
    }
}
