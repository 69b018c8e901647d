package org.modestead.knime.trial;

import java.util.List;
import java.util.Optional;
import org.knime.core.node.NodeDescription;
import org.knime.core.node.NodeDialogPane;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeView;
import org.modestead.knime.describe.DeclaredDescription;
import org.modestead.knime.view.ResultView;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;

/** Offers the source of {@link EveryKind} to the platform as a node that knows nothing of the bridge. */
public final class EveryKindFactory extends NodeFactory<EveryKindModel> {

    @Override
    protected NodeDescription createNodeDescription() {
        return new DeclaredDescription(new NodeDeclaration("every-kind", "Every Kind", NodeDeclaration.Stage.DATA, "Gives a table with every kind of column.",
                "Gives a table with every kind of column.", List.of(), List.of(), List.of(),
                List.of(Port.of("table", PortType.TABLE, "Table", "Every kind of column.")), List.of(), 1));
    }

    @Override
    public EveryKindModel createNodeModel() {
        return new EveryKindModel();
    }

    @Override
    protected int getNrNodeViews() {
        return 1;
    }

    @Override
    public NodeView<EveryKindModel> createNodeView(int viewIndex, EveryKindModel nodeModel) {
        return new ResultView<>(nodeModel, Optional::empty);
    }

    @Override
    protected boolean hasDialog() {
        return false;
    }

    @Override
    protected NodeDialogPane createNodeDialogPane() {
        throw new IllegalStateException("there is no dialog");
    }
}
