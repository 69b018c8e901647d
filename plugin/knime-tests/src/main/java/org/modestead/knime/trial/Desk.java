package org.modestead.knime.trial;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;

/**
 * The trial's entrance inside the platform: reads requests from standard input, one a line, and writes one answer a request.
 *
 * <p>A request is a word and its arguments, separated by tabs; an answer begins with {@value #MARK} and {@code ok} or
 * {@code failed}, and has its fields separated by tabs. Tabs and line ends inside a field are written as escapes.
 */
public final class Desk {

    /** Begins an answer, so that log lines between answers do no harm. */
    public static final String MARK = "@answer\t";

    private Desk() {}

    /**
     * Serves until standard input ends or {@code quit} is asked.
     *
     * @param arguments none
     */
    public static void main(String[] arguments) throws IOException {
        Thread.currentThread().setContextClassLoader(Desk.class.getClassLoader()); // the trial's own node is found as any extension's
        PrintStream answers = System.out;
        BufferedReader requests = new BufferedReader(new InputStreamReader(System.in, StandardCharsets.UTF_8));
        Requests served = new Requests();
        String line;
        while ((line = requests.readLine()) != null && !line.equals("quit")) {
            answers.println(MARK + answer(served, Stream.of(line.split("\t", -1)).map(Desk::unescaped).toList()));
            answers.flush();
        }
    }

    private static String answer(Requests served, List<String> request) {
        try {
            return fields("ok", served.serve(request.get(0), request.subList(1, request.size())));
        } catch (Exception | LinkageError failed) {
            return fields("failed", Stream.<Throwable>iterate(failed, Objects::nonNull, Throwable::getCause)
                    .flatMap(cause -> Stream.of(cause.getClass().getName(), Objects.toString(cause.getMessage(), ""))).toList());
        }
    }

    private static String fields(String first, List<String> others) {
        StringBuilder line = new StringBuilder(first);
        others.forEach(field -> line.append('\t').append(escaped(field)));
        return line.toString();
    }

    /** Writes a field so that it holds neither tab nor line end. */
    public static String escaped(String field) {
        return field.replace("\\", "\\\\").replace("\t", "\\t").replace("\n", "\\n").replace("\r", "\\r");
    }

    /** Reads what {@link #escaped} wrote. */
    public static String unescaped(String field) {
        StringBuilder text = new StringBuilder();
        for (int i = 0; i < field.length(); i++) {
            char c = field.charAt(i);
            if (c != '\\') {
                text.append(c);
                continue;
            }
            char code = field.charAt(++i);
            text.append(code == 't' ? '\t' : code == 'n' ? '\n' : code == 'r' ? '\r' : code);
        }
        return text.toString();
    }
}
