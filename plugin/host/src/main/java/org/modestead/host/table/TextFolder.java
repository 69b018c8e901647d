package org.modestead.host.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/**
 * Text files of the same columns as one table, one after the other. A column is of the type that it has in every file, a number where some of
 * them hold whole numbers only; where a file has no cell in it the others tell.
 *
 * @param shown the name of the folder as the person wrote it
 * @param parts its files
 * @param limits what it may cost
 */
record TextFolder(String shown, List<TextTable> parts, SourceLimits limits) implements Explainer {

    /** The database plans one query over all of them. */
    private static final int MOST = 1000;

    TextFolder {
        parts = List.copyOf(parts);
        if (parts.size() > MOST) {
            throw new TableFault(shown, "the folder holds " + parts.size() + " text files", "give at most " + MOST + ", or Parquet files");
        }
    }

    /**
     * Looks at the columns of all files and returns the table.
     *
     * @throws TableFault if a file has other columns than the first or holds something else in one of them, has no row, or a cell among those
     *     looked at that does not fit
     */
    DuckDbTable open() {
        List<String> names = parts.get(0).file().names();
        parts.forEach(part -> requireSame(part.file(), names));
        List<List<TextTyper.Found>> found = parts.stream().map(part -> part.found().columns()).toList();
        List<Column> columns = new ArrayList<>();
        for (int j = 0; j < names.size(); j++) {
            int at = j;
            Optional<CellType> type = type(names.get(j), found.stream().map(file -> file.get(at)).toList());
            if (type.isPresent() || parts.stream().anyMatch(part -> !part.file().unnamed().contains(names.get(at)))) {
                columns.add(new Column(names.get(j), type.orElse(CellType.DOUBLE)));
            }
        }
        String rows = parts.stream().map(part -> part.select(columns)).collect(Collectors.joining(" UNION ALL "));
        return new DuckDbTable(new Recipe("SELECT * FROM (" + rows + ")", parts.stream().map(part -> part.file().path()).toList(), Map.of()),
                new TableSchema(columns), shown, limits.holding(names.size()).megabytes(), limits.copied(), this);
    }

    private void requireSame(TextFile file, List<String> names) {
        if (!file.names().equals(names)) {
            throw new TableFault(file.shown(), "its columns are " + String.join(", ", file.names()) + ", those of " + parts.get(0).file().shown()
                    + " are " + String.join(", ", names), "give all files of the folder the same columns in the same order, or name one file");
        }
    }

    /** The type that every file agrees with; empty where none has a cell in the column. */
    private Optional<CellType> type(String name, List<TextTyper.Found> found) {
        Optional<CellType> type = Optional.empty();
        int from = 0;
        for (int i = 0; i < found.size(); i++) {
            CellType own = found.get(i).type();
            if (found.get(i).cells() == 0 || type.filter(own::equals).isPresent()) {
                continue;
            }
            if (type.isPresent() && !Set.of(CellType.LONG, CellType.DOUBLE).containsAll(Set.of(type.get(), own))) {
                throw new TableFault(parts.get(i).file().shown() + ", column " + name, "it is of type " + own.title() + " here and of type "
                        + type.get().title() + " in " + parts.get(from).file().shown(),
                        "correct the files, or name the column in the setting text-columns");
            }
            from = type.isPresent() ? from : i;
            type = type.isPresent() ? Optional.of(CellType.DOUBLE) : Optional.of(own);
        }
        return type;
    }

    @Override
    public Optional<TableFault> claim(DuckDbMessage message) {
        return parts.stream().flatMap(part -> part.claim(message).stream()).findFirst();
    }

    @Override
    public TableFault explain(DuckDbMessage message) {
        return limits.explain(shown, message).or(() -> claim(message))
                .or(() -> parts.stream().flatMap(part -> part.file().places().broken().stream()).findFirst())
                .orElseGet(() -> new TableFault(shown, message.brief(), "correct the files"));
    }
}
