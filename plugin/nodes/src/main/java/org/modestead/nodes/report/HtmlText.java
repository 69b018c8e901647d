package org.modestead.nodes.report;

/** Text made safe for a page. */
final class HtmlText {
    private HtmlText() {}

    /**
     * Escapes for element content and for quoted attributes; characters that no page may hold become U+FFFD.
     *
     * @param text any
     * @return without {@code < > & " '} as such
     */
    static String escape(String text) {
        StringBuilder out = new StringBuilder(text.length() + 16);
        text.codePoints().forEach(c -> {
            switch (c) {
                case '<' -> out.append("&lt;");
                case '>' -> out.append("&gt;");
                case '&' -> out.append("&amp;");
                case '"' -> out.append("&quot;");
                case '\'' -> out.append("&#39;");
                default -> out.appendCodePoint(allowed(c) ? c : 0xFFFD);
            }
        });
        return out.toString();
    }

    private static boolean allowed(int c) {
        boolean control = c < 0x20 && c != '\n' && c != '\t' || c >= 0x7F && c < 0xA0;
        boolean surrogate = c >= 0xD800 && c < 0xE000;
        return !control && !surrogate && (c & 0xFFFE) != 0xFFFE;
    }
}
