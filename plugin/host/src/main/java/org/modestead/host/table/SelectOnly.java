package org.modestead.host.table;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.sql.SQLException;
import java.util.Optional;
import org.modestead.nodes.contract.SettingProblem;

/** Lets one SELECT through and nothing else, as DuckDB's own parser reads it. */
final class SelectOnly {

    private static final String WANTED = "write one SELECT over input, input2 and input3";

    private SelectOnly() {}

    /** Returns what is wrong when the text is not one SELECT statement. */
    static Optional<SettingProblem> problem(Database database, String sql) throws SQLException {
        JsonNode parsed = tree(database.one("SELECT json_serialize_sql(" + Sql.text(sql) + "::VARCHAR)",
                row -> row.getString(1)));
        if (parsed.path("error").asBoolean()) {
            boolean syntax = parsed.path("error_type").asText().equals("parser");
            return Optional.of(new SettingProblem("sql", syntax ? parsed.path("error_message").asText() + place(parsed, sql)
                    : "the query is not a SELECT", WANTED));
        }
        int statements = parsed.path("statements").size();
        return statements == 1 ? Optional.empty()
                : Optional.of(new SettingProblem("sql", statements == 0 ? "there is no statement" : statements
                + " statements", WANTED));
    }

    private static String place(JsonNode parsed, String sql) {
        int position = Math.min(parsed.path("position").asInt(-1), sql.length());
        if (position < 0) {
            return "";
        }
        String before = sql.substring(0, position);
        long line = before.chars().filter(c -> c == '\n').count() + 1;
        return " at line " + line + ", column " + (position - before.lastIndexOf('\n'));
    }

    private static JsonNode tree(String json) {
        try {
            return new ObjectMapper().readTree(json);
        } catch (JsonProcessingException broken) {
            throw new IllegalStateException("DuckDB's parser gave broken JSON", broken);
        }
    }
}
