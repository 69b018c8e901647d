package org.modestead.knime.trial;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Reads a file as the platform's CSV Writer writes it (RFC 4180), without the embedded host's reader: header and rows, every cell as text. */
final class Csv {

    private final String text;
    private int at;

    private Csv(String text) {
        this.text = text;
    }

    static List<List<String>> rows(Path file) throws IOException {
        Csv csv = new Csv(Files.readString(file));
        List<List<String>> rows = new ArrayList<>();
        while (csv.at < csv.text.length()) {
            rows.add(csv.row());
        }
        return rows;
    }

    private List<String> row() {
        List<String> cells = new ArrayList<>(List.of(cell()));
        while (at < text.length() && text.charAt(at) == ',') {
            at++;
            cells.add(cell());
        }
        while (at < text.length() && (text.charAt(at) == '\r' || text.charAt(at) == '\n')) {
            at++;
        }
        return cells;
    }

    private String cell() {
        StringBuilder cell = new StringBuilder();
        boolean quoted = at < text.length() && text.charAt(at) == '"';
        at += quoted ? 1 : 0;
        while (at < text.length()) {
            char c = text.charAt(at);
            if (quoted && c == '"') {
                at++;
                if (at == text.length() || text.charAt(at) != '"') {
                    return cell.toString();
                }
            } else if (!quoted && (c == ',' || c == '\r' || c == '\n')) {
                return cell.toString();
            }
            cell.append(c);
            at++;
        }
        return cell.toString();
    }
}
