package org.modestead.host.recent;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Answers to questions, so many as were asked for last. Thread-safe; two threads that ask the same for the first time may both find out.
 *
 * @param <Q> a question, with equality
 * @param <A> its answer
 */
public final class RecentAnswers<Q, A> {

    private final int most;
    private final Map<Q, A> known = new LinkedHashMap<>(16, 0.75f, true);

    /** @param most answers that are kept */
    public RecentAnswers(int most) {
        this.most = most;
    }

    /** Returns what is known. */
    public synchronized Optional<A> find(Q question) {
        return Optional.ofNullable(known.get(question));
    }

    /** Keeps an answer; the one that was not asked for longest gives way. */
    public synchronized void keep(Q question, A answer) {
        known.put(question, answer);
        if (known.size() > most) {
            known.remove(known.keySet().iterator().next());
        }
    }
}
