package org.modestead.knime.view;

import java.util.Optional;
import java.util.function.Supplier;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeView;
import org.modestead.nodes.modelfile.ResultFile;

/**
 * The platform's view of a node: a {@link ResultPanel} of what the node found, made anew whenever the node has run. The class is
 * loaded, and with it the window system, only when somebody opens the view.
 *
 * @param <M> the node model
 */
public final class ResultView<M extends NodeModel> extends NodeView<M> {
    private final Supplier<Optional<ResultFile>> shown;

    /**
     * @param model of the node
     * @param shown what the model has to show, empty before it has run
     */
    public ResultView(M model, Supplier<Optional<ResultFile>> shown) {
        super(model);
        this.shown = shown;
    }

    @Override
    protected void modelChanged() {
        shown.get().ifPresent(result -> setComponent(new ResultPanel(result).component()));
    }

    @Override
    protected void onOpen() {
        // the platform calls modelChanged after it
    }

    @Override
    protected void onClose() {
        // holds nothing
    }
}
