package org.modestead.host.bench.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.modestead.host.workflow.Workflow;

/**
 * The document as it is and was: what undo goes back to and redo forward to. Immutable.
 *
 * @param moments from the oldest on; each with what led to it
 * @param now position of the document as it is
 */
public record Timeline(List<Moment> moments, int now) {

    /** Older moments are forgotten. */
    public static final int MOST_MOMENTS = 1000;

    /**
     * The document at one time.
     *
     * @param workflow the document
     * @param label what was done to it just before; empty for the first
     */
    public record Moment(Workflow workflow, String label) {}

    /** Takes an immutable copy. */
    public Timeline {
        moments = List.copyOf(moments);
    }

    /** Begins with a document. */
    public static Timeline begin(Workflow workflow) {
        return new Timeline(List.of(new Moment(workflow, "")), 0);
    }

    /** Returns the document as it is. */
    public Workflow current() {
        return moments.get(now).workflow();
    }

    /** Goes on with a changed document; what had been undone is gone. */
    public Timeline then(Workflow workflow, String label) {
        List<Moment> kept = new ArrayList<>(moments.subList(Math.max(0, now + 2 - MOST_MOMENTS), now + 1));
        kept.add(new Moment(workflow, label));
        return new Timeline(kept, kept.size() - 1);
    }

    /** Returns what undo would take back, empty when there is nothing. */
    public Optional<String> undoLabel() {
        return now > 0 ? Optional.of(moments.get(now).label()) : Optional.empty();
    }

    /** Returns what redo would do again, empty when there is nothing. */
    public Optional<String> redoLabel() {
        return now + 1 < moments.size() ? Optional.of(moments.get(now + 1).label()) : Optional.empty();
    }

    /** @throws EditFault if there is nothing to be undone */
    public Timeline undo() {
        if (now == 0) {
            throw new EditFault("undo", "nothing was done", "edit first");
        }
        return new Timeline(moments, now - 1);
    }

    /** @throws EditFault if nothing was undone */
    public Timeline redo() {
        if (now + 1 >= moments.size()) {
            throw new EditFault("redo", "nothing was undone", "undo first");
        }
        return new Timeline(moments, now + 1);
    }

    /** Returns the same with all moments in another file, as the document gets there. */
    public Timeline moved(UnaryOperator<Workflow> way) {
        return new Timeline(moments.stream().map(moment -> new Moment(way.apply(moment.workflow()), moment.label())).toList(), now);
    }

    /** Returns the same with all moments in another file, word for word. */
    public Timeline in(java.nio.file.Path file) {
        return new Timeline(moments.stream().map(moment -> new Moment(moment.workflow().in(file), moment.label())).toList(), now);
    }
}
