package org.modestead.knime.columns;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.regex.PatternSyntaxException;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;

/**
 * How the columns of a list are chosen: those that are named, or all that fit a rule at the time the node runs.
 *
 * <p>A rule is stored as one text: empty for named columns, {@code wildcard p_*}, {@code regex ^p_\d+$} or
 * {@code type number, whole number}.
 */
public sealed interface ColumnRule {

    /** Returns the rule as it is stored. */
    String text();

    /** Returns whether a column fits. */
    boolean takes(Column column);

    /** The columns that are named in the list itself. */
    record Named() implements ColumnRule {
        @Override
        public String text() {
            return "";
        }

        @Override
        public boolean takes(Column column) {
            return false;
        }
    }

    /**
     * Columns whose whole name fits a pattern in which {@code *} stands for any text and {@code ?} for any one character.
     *
     * @param pattern not blank
     */
    record Wildcard(String pattern) implements ColumnRule {
        @Override
        public String text() {
            return WILDCARD + pattern;
        }

        @Override
        public boolean takes(Column column) {
            return Pattern.compile(expression(), Pattern.DOTALL).matcher(column.name()).matches();
        }

        private String expression() {
            return pattern.codePoints().mapToObj(Character::toString)
                    .map(c -> c.equals("*") ? ".*" : c.equals("?") ? "." : Pattern.quote(c)).collect(Collectors.joining());
        }
    }

    /**
     * Columns whose whole name fits a regular expression.
     *
     * @param expression as in {@link Pattern}
     */
    record Regex(String expression) implements ColumnRule {
        @Override
        public String text() {
            return REGEX + expression;
        }

        @Override
        public boolean takes(Column column) {
            return Pattern.compile(expression).matcher(column.name()).matches();
        }
    }

    /** Columns of some types. */
    record OfType(Set<CellType> types) implements ColumnRule {

        /** Takes an immutable copy. */
        public OfType {
            types = Set.copyOf(types);
        }

        @Override
        public String text() {
            return TYPE + Stream.of(CellType.values()).filter(types::contains).map(CellType::title).collect(Collectors.joining(", "));
        }

        @Override
        public boolean takes(Column column) {
            return types.contains(column.type());
        }
    }

    /** First word of a stored wildcard rule. */
    String WILDCARD = "wildcard ";
    /** First word of a stored regular expression. */
    String REGEX = "regex ";
    /** First word of a stored list of types. */
    String TYPE = "type ";

    /**
     * Reads a stored rule.
     *
     * @param key of the setting that holds it, for messages
     * @param text as stored
     * @throws SettingFault if it is none
     */
    static ColumnRule parse(String key, String text) {
        if (text.isBlank()) {
            return new Named();
        } else if (text.startsWith(WILDCARD) && text.length() > WILDCARD.length()) {
            return new Wildcard(text.substring(WILDCARD.length()));
        } else if (text.startsWith(REGEX) && text.length() > REGEX.length()) {
            return regex(key, text.substring(REGEX.length()));
        } else if ((text + " ").startsWith(TYPE)) {
            return ofType(key, text.substring(TYPE.length() - 1));
        }
        if (text.strip().equals(WILDCARD.strip()) || text.strip().equals(REGEX.strip())) {
            throw new SettingFault("setting " + key, "a rule without a pattern", "give a pattern, or name the columns");
        }
        throw new SettingFault("setting " + key, "the rule \"" + text + "\"",
                "write wildcard, regex or type and what columns must fit, such as wildcard p_*, or leave it empty");
    }

    private static ColumnRule regex(String key, String expression) {
        try {
            Pattern.compile(expression);
        } catch (PatternSyntaxException wrong) {
            throw new SettingFault("setting " + key, "the regular expression \"" + expression + "\" ("
                    + wrong.getDescription().toLowerCase(Locale.ROOT) + ")",
                    "write one that can be read, such as p_\\d+ for p_ and a number");
        }
        return new Regex(expression);
    }

    private static ColumnRule ofType(String key, String titles) {
        Set<CellType> types = new LinkedHashSet<>();
        List<String> unknown = new ArrayList<>();
        for (String title : titles.split(",")) {
            Stream.of(CellType.values()).filter(type -> type.title().equals(title.strip())).findFirst()
                    .ifPresentOrElse(types::add, () -> unknown.add(title.strip()));
        }
        if (!unknown.isEmpty()) {
            throw new SettingFault("setting " + key, unknown.get(0).isEmpty() ? "a rule without a type" : "the type " + unknown.get(0),
                    "use " + SettingText.types(Set.of(CellType.values())));
        }
        return new OfType(types);
    }
}
