package org.modestead.host.bench.recording;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Guesses how a file is written: format, delimiter, decimal sign, header, lines before it, dates. */
final class ReadingGuess {

    private static final Map<Character, String> DELIMITERS = delimiters();
    private static final Pattern POINT = Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d+)?");
    private static final Pattern COMMA = Pattern.compile("[+-]?(\\d+,\\d+|,\\d+)([eE][+-]?\\d+)?");
    private static final double MOST_OF_LINES = 0.5;

    private final List<String> all;
    private final List<String> lines;
    private char delimiter = ',';
    private int skipped;

    private ReadingGuess(List<String> lines) {
        this.all = lines;
        this.lines = lines.stream().filter(line -> !line.isBlank()).toList();
    }

    private static Map<Character, String> delimiters() {
        Map<Character, String> delimiters = new LinkedHashMap<>();
        delimiters.put(';', "semicolon");
        delimiters.put('\t', "tab");
        delimiters.put('|', "bar");
        delimiters.put(',', "comma");
        return delimiters;
    }

    /** Returns settings of the step that reads the file, by key. */
    static Map<String, Object> of(Path file) throws IOException {
        String name = file.getFileName().toString().toLowerCase(Locale.ROOT);
        Map<String, Object> reading = new LinkedHashMap<>();
        if (name.endsWith(".parquet")) {
            reading.put("format", "parquet");
        } else if (Stream.of(".json", ".jsonl", ".ndjson", ".json.gz").anyMatch(name::endsWith)) {
            reading.put("format", "json");
        } else {
            TextSample sample = TextSample.of(file);
            reading.put("format", "csv");
            new ReadingGuess(sample.lines()).guess(reading);
            reading.put("encoding", sample.encoding());
        }
        return reading;
    }

    private void guess(Map<String, Object> reading) {
        chooseDelimiter();
        List<String> first = lines.isEmpty() ? List.of() : cells(lines.get(skipped));
        List<List<String>> rows = lines.stream().skip(skipped + 1L).map(this::cells).toList();
        boolean header = rows.isEmpty() || first.stream().anyMatch(cell -> !cell.isEmpty() && !isValue(cell)) || first.stream().allMatch(String::isEmpty);
        List<List<String>> data = header ? rows : Stream.concat(Stream.of(first), rows.stream()).toList();
        reading.put("delimiter", DELIMITERS.get(delimiter));
        reading.put("decimal", delimiter != ',' && hasCommas(data) ? "comma" : "point");
        reading.put("header", header);
        reading.put("skip-lines", skipped == 0 ? 0 : all.indexOf(lines.get(skipped)));
        reading.put("time-format", DateForm.of(data).orElse(""));
    }

    private static boolean isValue(String cell) {
        return POINT.matcher(cell).matches() || COMMA.matcher(cell).matches() || DateForm.isMoment(cell)
                || List.of("nan", "na", "n/a", "null", "-", "true", "false").contains(cell.toLowerCase(Locale.ROOT));
    }

    private static boolean hasCommas(List<List<String>> rows) {
        long commas = rows.stream().flatMap(List::stream).filter(cell -> COMMA.matcher(cell).matches()).count();
        long points = rows.stream().flatMap(List::stream).filter(cell -> cell.contains(".") && POINT.matcher(cell).matches()).count();
        return commas > points;
    }

    /** Takes the delimiter that cuts most lines into the same number of cells; lines before the first such line are no part of the table. */
    private void chooseDelimiter() {
        double best = 0;
        for (char candidate : DELIMITERS.keySet()) {
            List<Integer> counts = lines.stream().map(line -> cut(line, candidate).size()).toList();
            int usual = counts.stream().filter(count -> count > 1).collect(Collectors.groupingBy(count -> count, Collectors.counting())).entrySet().stream()
                    .max(Map.Entry.<Integer, Long>comparingByValue().thenComparing(Map.Entry.comparingByKey())).map(Map.Entry::getKey).orElse(0);
            double share = lines.isEmpty() ? 0 : counts.stream().filter(count -> count == usual).count() / (double) lines.size();
            if (usual > 1 && share > best + 1e-9 && share >= MOST_OF_LINES) {
                best = share;
                delimiter = candidate;
                skipped = counts.indexOf(usual);
            }
        }
    }

    private List<String> cells(String line) {
        return cut(line, delimiter);
    }

    private static List<String> cut(String line, char delimiter) {
        List<String> cells = new ArrayList<>();
        StringBuilder cell = new StringBuilder();
        boolean quoted = false;
        for (char letter : line.toCharArray()) {
            if (letter == '"') {
                quoted = !quoted;
            } else if (letter == delimiter && !quoted) {
                cells.add(cell.toString().strip());
                cell.setLength(0);
            } else {
                cell.append(letter);
            }
        }
        cells.add(cell.toString().strip());
        return cells;
    }
}
