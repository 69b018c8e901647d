package org.modestead.engine.wellposed;

import java.util.List;
import org.modestead.engine.Progress;

/** One question put to the evidence. Found by {@link java.util.ServiceLoader}; others may add theirs. */
public interface Check {

    /** Returns the stable id, lower case with dashes. */
    String id();

    /**
     * Answers the question.
     *
     * @param evidence all of it
     * @param progress polled for cancel
     * @return a finding for the operator as a whole (mode 0) and, or, one a mode
     */
    List<Finding> examine(Evidence evidence, Progress progress);
}
