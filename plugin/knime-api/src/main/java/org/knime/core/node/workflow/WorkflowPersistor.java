package org.knime.core.node.workflow;

/** Signatures of the platform's public interface of this name; no behaviour. */
public interface WorkflowPersistor {
    /** One line of a tree of messages. */
    class LoadResultEntry {
        LoadResultEntry() {
            throw new UnsupportedOperationException();
        }

        public boolean hasErrors() {
            throw new UnsupportedOperationException();
        }

        public boolean hasWarningEntries() {
            throw new UnsupportedOperationException();
        }

        public String getFilteredError(final String indent, final LoadResultEntryType filter) {
            throw new UnsupportedOperationException();
        }

        /** How bad. */
        public enum LoadResultEntryType {
            Ok,
            Warning,
            Error,
            DataLoadError
        }
    }

    /** A tree of messages. */
    class LoadResult extends LoadResultEntry {
        LoadResult() {
            throw new UnsupportedOperationException();
        }
    }

    /** What loading a linked part gives. */
    class MetaNodeLinkUpdateResult extends LoadResult {
        MetaNodeLinkUpdateResult() {
            throw new UnsupportedOperationException();
        }
    }

    /** What loading a workflow gives. */
    final class WorkflowLoadResult extends MetaNodeLinkUpdateResult {
        private WorkflowLoadResult() {
            throw new UnsupportedOperationException();
        }

        public WorkflowManager getWorkflowManager() {
            throw new UnsupportedOperationException();
        }
    }
}
