package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Path;
import java.sql.SQLException;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.modestead.host.output.CsvWriter;
import org.modestead.host.output.Disk;
import org.modestead.host.output.OutputFault;
import org.modestead.host.output.WholeFile;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.files.InOneStep;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Node: writes a table to a file, whole or not at all. */
public final class TableSink implements Node {

    private static final String AUTO = "auto";
    private static final String CSV = "csv";
    private static final String PARQUET = "parquet";
    private static final String JSON = "json";

    /** Makes the node; it has no state. */
    public TableSink() {}

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("table-sink", "Table Sink", NodeDeclaration.Stage.REPORT,
                "Writes a table to a CSV, Parquet or JSON file.",
                """
                Writes the rows as they come, so the table may be far larger than memory. The file appears under its name
                only when it is complete; one that was there before stays until then.

                CSV is written as UTF-8 with a header, commas, line feeds and a decimal point; a missing cell is empty.
                Every table of a workflow is written to the result folder anyway: this step is for a file in another place
                or format.""",
                List.of("RFC 4180, Common Format and MIME Type for CSV Files, 2005"),
                List.of("csv", "parquet", "json", "export", "write", "save", "file"),
                List.of(Port.of("table", PortType.TABLE, "Table", "The rows to be written.")),
                List.of(), settings(), 1);
    }

    private static List<Setting> settings() {
        return List.of(
                new Setting.File(new Setting.Common("path", "File", "File", "The file to write; a name is taken in the "
                + "folder "
                        + "of the workflow. Missing folders are made."), false, List.of(CSV, PARQUET, JSON), true),
                new Setting.Choice(new Setting.Common("format", "Format", "File", "How the file is written; auto goes by "
                + "the "
                        + "end of its name: .parquet, .json, and CSV for all others."),
                        List.of(new Setting.Option(AUTO, "By name", "Goes by the end of the file's name."),
                                new Setting.Option(CSV, "CSV", "Text with one row a line."),
                                new Setting.Option(PARQUET, "Parquet", "Columnar file with typed columns."),
                                new Setting.Option(JSON, "JSON", "A list of objects.")), AUTO));
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        WholeFile.checkTarget(target(settings, context), settings.text("path"));
        return Map.of();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Path target = target(settings, context);
        String shown = settings.text("path");
        Table table = inputs.get("table", Table.class);
        WholeFile.checkTarget(target, shown);
        try {
            String format = format(settings);
            if (format.equals(CSV)) {
                WholeFile.write(Disk.REAL, target, out -> CsvWriter.write(table, out, context.progress()));
            } else {
                InOneStep.make(target, part -> copy(table, part, format));
            }
        } catch (IOException unwritable) {
            throw OutputFault.of(shown, unwritable);
        }
        return new NodeResult(Map.of(), List.of(), List.of("Written to " + shown + "."), List.of());
    }

    private static void copy(Table table, Path part, String format) throws IOException {
        Recipe recipe = Recipe.of(table);
        try (Database database = Database.open(Database.USUAL_MEGABYTES)) {
            recipe.prepare(database, List.of(part));
            database.execute("COPY (" + recipe.select() + ") TO " + Sql.text(part.toString()) + " (FORMAT " + format
                    + (format.equals(JSON) ? ", ARRAY true" : "") + ")");
        } catch (SQLException failure) {
            DuckDbMessage message = DuckDbMessage.of(failure);
            if (table instanceof DuckDbTable stored) {
                stored.explainer().claim(message).ifPresent(fault -> {
                    throw fault;
                });
            }
            throw new IOException(message.brief(), failure);
        }
    }

    private static Path target(Settings settings, RunContext context) {
        return context.baseFolder().resolve(settings.text("path")).toAbsolutePath().normalize();
    }

    private static String format(Settings settings) {
        String chosen = settings.text("format");
        String name = settings.text("path").toLowerCase(Locale.ROOT);
        if (!chosen.equals(AUTO)) {
            return chosen;
        }
        return name.endsWith(".parquet") ? PARQUET : name.endsWith(".json") ? JSON : CSV;
    }
}
