package org.modestead.host.table;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.channels.Channels;
import java.nio.channels.SeekableByteChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.zip.CRC32C;
import org.modestead.host.recent.RecentAnswers;

/**
 * What the columns of files were found to hold, so that a check and the run behind it do not both read a file to its end. An answer holds
 * for one way of reading one file, as long as the file's size, time of change, key in its file system, beginning and end are those of
 * before. A change that hides from all these cannot falsify a result: a cell that is not of its column's type is an error that names it.
 * Thread-safe; no lock is held while a file is read.
 */
final class RememberedTypes {

    private static final int MOST = 200;

    /** Bytes of the beginning and of the end that are compared. */
    private static final int PIECE = 1 << 16;

    /** A file that changed this shortly before it was read may change again within one tick of the clock of its file system. */
    private static final long UNSETTLED_MILLIS = 2_000;

    private final RecentAnswers<Question, TextTyper.Result> known = new RecentAnswers<>(MOST);

    /** Finds types by reading. */
    interface Search<E extends Exception> {
        TextTyper.Result types() throws E;
    }

    /**
     * What an answer depends on.
     *
     * @param read table expression with the place of the file and how it is written
     * @param rules how texts become cells
     * @param file how it was when it was read
     */
    private record Question(String read, TextRules rules, Print file) {}

    private record Print(long size, long changedNanos, String key, long ends) {}

    /** Returns what is known, or what a search finds. */
    <E extends Exception> TextTyper.Result of(TextFile file, TextRules rules, Search<E> search) throws E {
        Optional<Question> question = print(file.path()).map(print -> new Question(file.read(), rules, print));
        if (question.isEmpty()) {
            return search.types();
        }
        Optional<TextTyper.Result> before = known.find(question.get());
        if (before.isPresent()) {
            return before.get();
        }
        TextTyper.Result found = search.types();
        if (print(file.path()).filter(question.get().file()::equals).isPresent()) {
            known.keep(question.get(), found);
        }
        return found;
    }

    /** Returns nothing where the file cannot be read or has just changed. */
    private static Optional<Print> print(Path path) {
        long now = System.currentTimeMillis();
        try {
            BasicFileAttributes facts = Files.readAttributes(path, BasicFileAttributes.class);
            if (now - facts.lastModifiedTime().toMillis() <= UNSETTLED_MILLIS) {
                return Optional.empty();
            }
            return Optional.of(new Print(facts.size(), facts.lastModifiedTime().to(TimeUnit.NANOSECONDS),
                    String.valueOf(facts.fileKey()), ends(path, facts.size())));
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    private static long ends(Path path, long size) throws IOException {
        CRC32C sum = new CRC32C();
        try (SeekableByteChannel channel = Files.newByteChannel(path); InputStream in = Channels.newInputStream(channel)) {
            sum.update(ByteBuffer.wrap(in.readNBytes(PIECE)));
            channel.position(Math.max(0, size - PIECE));
            sum.update(ByteBuffer.wrap(in.readNBytes(PIECE)));
        }
        return sum.getValue();
    }
}
