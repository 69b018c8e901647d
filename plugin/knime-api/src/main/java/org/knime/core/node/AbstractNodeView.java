package org.knime.core.node;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class AbstractNodeView<T extends AbstractNodeView.ViewableModel> {
    protected AbstractNodeView(final T model) {
        throw new UnsupportedOperationException();
    }

    protected abstract void modelChanged();

    public interface ViewableModel {
    }
}
