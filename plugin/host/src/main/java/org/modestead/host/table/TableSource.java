package org.modestead.host.table;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalLong;
import java.util.stream.Stream;
import org.modestead.engine.Doubt;
import org.modestead.host.output.UnfinishedRun;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Node: brings in a table from a file. */
public final class TableSource implements Node {

    private static final String CSV = "csv";
    private static final String PARQUET = "parquet";
    private static final String JSON = "json";
    private static final String NPY = "npy";
    private static final String AUTO = "auto";
    /** Endings of text files that are found in a folder. */
    private static final String TEXTS = "(csv|tsv|txt)(\\.gz)?";
    private static final long MOST_SKIPPED = 1_000_000;

    private final RememberedTypes types = new RememberedTypes();

    /** Makes the node; it remembers nothing but what the columns of files hold. */
    public TableSource() {}

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("table-source", "Table Source", NodeDeclaration.Stage.DATA,
                "Reads a table from a CSV, Parquet, JSON or NPY file.",
                """
                Reads the file row by row whenever somebody asks for the rows, so it may be far larger than memory.

                In a CSV or JSON file a column is of the type that more than half of its cells have: whole number, number,
                true/false, date, date-time or text. A cell that does not fit is an error that names row, column and text;
                it never turns the column into text by itself. Dates and times are written as in 2015-06-30 and
                2015-06-30T12:00:00 unless the setting time-format says otherwise. A last column without a name and
                without any cell (a delimiter at the end of each line) is left out; other columns without a name are
                called column1, column2 and so on by their position.

                A folder of CSV files (.csv, .tsv, .txt, also .gz) is one table, as recorders write it that begin a file a day: file after file
                in the order of their names, each with the same header. Name files so that this is the order of time, or give each run a
                column of its own. Files whose names begin with a point or a low line are passed over. Where there are Parquet files, those
                are read unless the format says CSV.

                An NPY file holds an array as NumPy saves it, one row a time: its fields are columns of their names, other arrays give columns
                called column1, column2 and so on, and one column of lists called values where there are more than 1000.

                The types are found in the first 20480 rows; columns that look whole or empty there are read to the end
                once more.""",
                List.of("RFC 4180, Common Format and MIME Type for CSV Files, 2005"),
                List.of("csv", "parquet", "json", "npy", "numpy", "import", "read", "load", "file"),
                List.of(),
                List.of(Port.of("table", PortType.TABLE, "Table", "The rows of the file.")),
                settings(), 1);
    }

    private static List<Setting> settings() {
        return Stream.of(fileSettings(), csvSettings(), cellSettings(), limitSettings()).flatMap(List::stream).toList();
    }

    private static List<Setting> fileSettings() {
        return List.of(
                new Setting.File(new Setting.Common("path", "File", "File",
                        "The file to read; a name is looked up in the folder of the workflow. A folder of Parquet or of CSV files of the same"
                        + " columns is read as one table, in the order of their names."), true,
                        List.of(CSV, "tsv", "txt", "gz", PARQUET, JSON, "jsonl", "ndjson", NPY), true),
                new Setting.Choice(new Setting.Common("format", "Format", "File", "How the file is written; auto goes by "
                + "the "
                        + "end of its name: .parquet, .json, .jsonl, .ndjson, .npy, and CSV for all others."),
                        List.of(new Setting.Option(AUTO, "By name", "Goes by the end of the file's name."),
                                new Setting.Option(CSV, "CSV", "Text with one row a line; also gzipped."),
                                new Setting.Option(PARQUET, "Parquet", "Columnar file with typed columns."),
                                new Setting.Option(JSON, "JSON", "A list of objects, or one object a line."),
                                new Setting.Option(NPY, "NPY", "An array as NumPy saves it.")), AUTO));
    }

    private static List<Setting> csvSettings() {
        return List.of(
                new Setting.Choice(csv("delimiter", "Delimiter",
                        "What stands between cells; auto takes the one that occurs most in the first line."),
                        List.of(new Setting.Option(AUTO, "Found", "The most frequent in the first line."),
                                new Setting.Option("comma", "Comma", "a,b"),
                                new Setting.Option("semicolon", "Semicolon", "a;b"),
                                new Setting.Option("tab", "Tab", "A tab character."),
                                new Setting.Option("bar", "Bar", "a|b")), AUTO),
                new Setting.Flag(csv("header", "Header", "Whether the first line names the columns; without, they are "
                        + "called column1, column2 and so on."), true),
                new Setting.Choice(csv("decimal", "Decimal sign", "How numbers are written."),
                        List.of(new Setting.Option("point", "Point", "1.5"),
                                new Setting.Option("comma", "Comma", "1,5")), "point"),
                new Setting.Choice(csv("encoding", "Encoding", "How letters are stored."),
                        List.of(new Setting.Option("utf-8", "UTF-8", "What nearly every program writes."),
                                new Setting.Option("latin-1", "Latin-1", "ISO 8859-1, older Western programs."),
                                new Setting.Option("utf-16", "UTF-16", "Two bytes a letter.")), "utf-8"),
                new Setting.Whole(csv("skip-lines", "Lines to skip",
                        "Lines before the header that are not part of the table."), "", 0, MOST_SKIPPED,
                        OptionalLong.of(0)));
    }

    private static List<Setting> cellSettings() {
        return List.of(
                new Setting.Texts(text("missing", "Missing",
                        "Texts that stand for a missing cell, besides the empty one."),
                        List.of("NA", "N/A", "NaN", "nan", "null", "NULL")),
                new Setting.Texts(text("text-columns", "Text columns",
                        "Columns to be read as text whatever they hold, for example numbers that are names."), List.of()),
                new Setting.Text(text("time-format", "Time format", "How dates or date-times are written where it is not "
                        + "ISO 8601, in strptime codes: %d.%m.%Y %H:%M:%S for 30.06.2015 12:00:00."), "", false, false));
    }

    private static List<Setting> limitSettings() {
        return List.of(
                new Setting.Whole(new Setting.Common("memory", "Memory", "Limits",
                        "Memory for reading; any file can be read with the default, because it is never loaded "
                        + "whole. A text file takes at least 0.2 MB a column."), "MB",
                        Database.LEAST_MEGABYTES, Database.MOST_MEGABYTES, OptionalLong.of(Database.USUAL_MEGABYTES)),
                new Setting.Flag(new Setting.Common("copy", "Copy to results", "Limits", "Whether the table as read is "
                        + "written to the result folder too; switch it off for very large files."), true));
    }

    private static Setting.Common csv(String key, String label, String help) {
        return new Setting.Common(key, label, "CSV", help).when("format", AUTO, CSV);
    }

    private static Setting.Common text(String key, String label, String help) {
        return new Setting.Common(key, label, "Cells", help).when("format", AUTO, CSV, JSON);
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        return Map.of("table", open(settings, context).schema());
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Table table = open(settings, context);
        List<String> columns = table.schema().columns().stream()
                .map(column -> column.name() + " (" + column.type().title() + ")").toList();
        return new NodeResult(Map.of("table", table), List.of(),
                List.of("Read from " + table.origin() + " with " + columns.size() + " columns: " + String.join(", ", columns)
                + "."),
                UnfinishedRun.doubtOf(path(settings, context)).map(sentence -> new Doubt("unfinished-run", sentence)).stream().toList());
    }

    private static Path path(Settings settings, RunContext context) {
        return context.baseFolder().resolve(settings.text("path")).toAbsolutePath().normalize();
    }

    private Table open(Settings settings, RunContext context) {
        String shown = settings.text("path");
        Path path = path(settings, context);
        SourceLimits limits = new SourceLimits(settings.whole("memory"), settings.flag("copy"));
        if (List.of(AUTO, PARQUET).contains(settings.text("format")) && ParquetSource.isFolder(path)) {
            return ParquetSource.open(path, shown, limits);
        }
        if (List.of(AUTO, CSV).contains(settings.text("format")) && Files.isDirectory(path)) {
            List<Path> files = FolderFiles.of(path, shown, TEXTS);
            if (!files.isEmpty()) {
                return new TextFolder(shown, files.stream().map(file -> csv(settings, file, shown + "/" + file.getFileName(), limits)).toList(), limits)
                        .open();
            }
        }
        FileChecks.readable(path, shown);
        String format = format(settings, shown);
        if (format.equals(PARQUET)) {
            return ParquetSource.open(path, shown, limits);
        }
        if (format.equals(NPY)) {
            return NpyTable.open(path, shown, settings.flag("copy"));
        }
        if (format.equals(JSON)) {
            return text(JsonSource.open(path, shown, settings.texts("missing"), limits), settings, false, limits).open();
        }
        return csv(settings, path, shown, limits).open();
    }

    private TextTable csv(Settings settings, Path path, String shown, SourceLimits limits) {
        FileChecks.readable(path, shown);
        return text(CsvSource.open(csvFormat(settings, path, shown), settings.texts("missing")), settings, settings.text("decimal").equals("comma"),
                limits);
    }

    private TextTable text(TextFile file, Settings settings, boolean comma, SourceLimits limits) {
        TextRules rules = new TextRules(comma, settings.text("time-format").strip(), settings.texts("text-columns"));
        return new TextTable(file, rules, limits.holding(file.names().size()), types);
    }

    private static String format(Settings settings, String shown) {
        String chosen = settings.text("format");
        String name = shown.toLowerCase(Locale.ROOT);
        if (!chosen.equals(AUTO)) {
            return chosen;
        } else if (name.endsWith(".parquet")) {
            return PARQUET;
        } else if (name.endsWith(".npy")) {
            return NPY;
        }
        String plain = name.endsWith(".gz") ? name.substring(0, name.length() - ".gz".length()) : name;
        return plain.endsWith(".json") || plain.endsWith(".jsonl") || plain.endsWith(".ndjson") ? JSON : CSV;
    }

    private static CsvFormat csvFormat(Settings settings, Path path, String shown) {
        Charset encoding = switch (settings.text("encoding")) {
            case "latin-1" -> StandardCharsets.ISO_8859_1;
            case "utf-16" -> StandardCharsets.UTF_16;
            default -> StandardCharsets.UTF_8;
        };
        CsvFormat format = new CsvFormat(path, shown, ',', settings.flag("header"), encoding, settings.whole("skip-lines"));
        return format.withDelimiter(switch (settings.text("delimiter")) {
            case "comma" -> ',';
            case "semicolon" -> ';';
            case "tab" -> '\t';
            case "bar" -> '|';
            default -> CsvHeader.delimiter(format, settings.text("decimal").equals("comma"));
        });
    }
}
