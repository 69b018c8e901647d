package org.modestead.host.table;

import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Node: prepares tables with one SQL query. */
public final class TableQuery implements Node {

    private static final String EXAMPLE = "One SELECT, for example: SELECT time, flow, head - 2.5 AS head FROM input "
            + "WHERE time >= 10 ORDER BY time";
    private static final List<String> INPUTS = List.of("input", "input2", "input3");

    /** Makes the node; it has no state. */
    public TableQuery() {}

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("table-query", "Table Query", NodeDeclaration.Stage.DATA,
                "Prepares tables with one SQL query: choose, join, filter, compute, group, sort.",
                """
                Runs one SELECT over the connected tables, which are called input, input2 and input3 in it. The dialect is
                DuckDB's.

                The query sees these tables and nothing else: no other file, no network, no setting can be reached from
                it, and only a SELECT is accepted. Rows come in the order of the input unless the query sorts them; add
                ORDER BY after grouping or joining, since a recording needs rising times.

                Rows are made whenever somebody asks for them. What does not fit into the memory limit goes to a temporary
                folder.""",
                List.of(),
                List.of("sql", "select", "filter", "join", "aggregate", "group", "sort", "resample", "compute column"),
                List.of(Port.of("input", PortType.TABLE, "Table", "Called input in the query."),
                        Port.optional("input2", PortType.TABLE, "Second table", "Called input2 in the query."),
                        Port.optional("input3", PortType.TABLE, "Third table", "Called input3 in the query.")),
                List.of(Port.of("table", PortType.TABLE, "Table", "The rows that the query gives.")),
                List.of(new Setting.Text(new Setting.Common("sql", "Query", "Query", EXAMPLE), "SELECT * FROM input", true,
                false),
                        new Setting.Whole(new Setting.Common("memory", "Memory", "Limits",
                                "Memory for the query; what does not fit goes to a temporary folder."), "MB",
                                Database.LEAST_MEGABYTES, Database.MOST_MEGABYTES,
                                OptionalLong.of(Database.USUAL_MEGABYTES))),
                1);
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        SourceLimits limits = new SourceLimits(settings.whole("memory"), true);
        try (Database database = Database.open(limits.megabytes())) {
            return SelectOnly.problem(database, withoutEnd(settings.text("sql"))).stream().toList();
        } catch (SQLException failure) {
            throw new QueryExplainer(List.of(), limits).explain(failure);
        }
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        return inputs.containsKey("input") ? Map.of("table", shape(inputs, settings).schema()) : Map.of();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        List<String> connected = INPUTS.stream().filter(port -> inputs.find(port, Table.class).isPresent()).toList();
        List<Table> tables = connected.stream().map(port -> inputs.get(port, Table.class)).toList();
        Map<String, TableSchema> schemas = connected.stream()
                .collect(Collectors.toMap(port -> port, port -> inputs.get(port, Table.class).schema()));
        SelectShape shape = shape(schemas, settings);
        List<Recipe> recipes = tables.stream().map(Recipe::of).toList();
        List<String> named = new ArrayList<>();
        for (int i = 0; i < recipes.size(); i++) {
            named.add(connected.get(i) + " AS (" + recipes.get(i).select() + ")");
        }
        Recipe recipe = Recipe.over("WITH " + String.join(", ", named) + " " + shape.select(), recipes);
        SourceLimits limits = new SourceLimits(settings.whole("memory"), true);
        DuckDbTable table = new DuckDbTable(recipe, shape.schema(), "query of " + tables.get(0).origin(),
                limits.megabytes(), true,
                new QueryExplainer(tables, limits));
        return new NodeResult(Map.of("table", table), List.of(),
                List.of("Query with " + shape.schema().columns().size() + " columns: "
                        + String.join(", ", shape.schema().names()) + "."), List.of());
    }

    /** Finds the columns of the query over empty tables with the inputs' columns: nothing is read. */
    private static SelectShape shape(Map<String, TableSchema> inputs, Settings settings) {
        String sql = withoutEnd(settings.text("sql"));
        SourceLimits limits = new SourceLimits(settings.whole("memory"), true);
        try (Database database = Database.open(limits.megabytes())) {
            SelectOnly.problem(database, sql).ifPresent(problem -> {
                throw new TableFault("setting sql", problem.seen(), problem.wanted());
            });
            for (String port : INPUTS) {
                if (inputs.containsKey(port)) {
                    database.execute("CREATE TABLE " + port + inputs.get(port).columns().stream()
                            .map(column -> Sql.name(column.name()) + " " + SqlTypes.sqlType(column.type()))
                            .collect(Collectors.joining(", ", " (", ")")));
                }
            }
            database.confine(List.of());
            return SelectShape.of(database, sql, "setting sql");
        } catch (SQLException failure) {
            throw new QueryExplainer(List.of(), limits).explain(failure);
        }
    }

    private static String withoutEnd(String sql) {
        String stripped = sql.strip();
        while (stripped.endsWith(";")) {
            stripped = stripped.substring(0, stripped.length() - 1).strip();
        }
        return stripped;
    }

    /** The refusal may be about an input's file; the query is blamed for the rest. */
    private record QueryExplainer(List<Table> inputs, SourceLimits limits) implements Explainer {

        @Override
        public Optional<TableFault> claim(DuckDbMessage message) {
            return inputs.stream().filter(DuckDbTable.class::isInstance)
                    .flatMap(table -> ((DuckDbTable) table).explainer().claim(message).stream()).findFirst();
        }

        @Override
        public TableFault explain(DuckDbMessage message) {
            return claim(message).or(() -> limits.explain("setting sql", message))
                    .orElseGet(() -> new TableFault("setting sql", message.brief(), "correct the query"));
        }
    }
}
