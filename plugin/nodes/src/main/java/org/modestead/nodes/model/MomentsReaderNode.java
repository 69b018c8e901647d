package org.modestead.nodes.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.moments.Moments;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.fit.MomentFitting;
import org.modestead.nodes.table.TableSchema;

/** Takes up the sums that a job on other machines left, and fits the operator to them. */
public final class MomentsReaderNode implements Node {

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("moments-reader", "Moments Reader", NodeDeclaration.Stage.FIT,
                "Fits an operator to sums that a job on many machines wrote.",
                """
                The job for Apache Spark sums up products of the functions now and one step later over all pairs of states, and keeps a \
                random sample of stretches. Here the operator is fitted to these sums: the rank can be chosen anew without reading the \
                recording again. The figures are those of the Streaming Fit, and of a fit in memory, to about ten digits.

                A file that is broken, changed or of a later version is refused with a sentence; nothing in a file is ever run.

                Cost: functions cubed. Memory: that of the file.""",
                List.of("Williams, Kevrekidis and Rowley, A data-driven approximation of the Koopman operator, Journal of Nonlinear Science"
                        + " 25:1307, 2015"),
                List.of("spark", "cluster", "distributed", "moments", "large", "load", "open", "import"),
                List.of(),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Stretches that were kept, of what trains and of what the fit"
                        + " never saw."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator, of all rows that train."),
                        Port.table("fit", "Fit", "What was fitted and how well it is conditioned.", MomentFitting.TABLE),
                        Port.table("summary", "Summary", "What was found in the recording and kept of it.", MomentFitting.TABLE)),
                settings(), 1);
    }

    private static List<Setting> settings() {
        List<Setting> all = new ArrayList<>();
        all.add(new Setting.File(new Common(ModelPath.SETTING, "File", "File", "The file to read; a name is looked up in the folder of the"
                + " workflow."), true, List.of(ModelPath.EXTENSION), true));
        all.addAll(MomentFitting.settings());
        return all;
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        ModelPath.of(settings, context).requireReadable();
        return Map.of();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        ModelPath file = ModelPath.of(settings, context);
        Moments moments = file.readMoments(context.progress().part(0, 0.5));
        if (moments.pilot().isEmpty()) {
            throw new ModelFileFault(file.shown(), "it holds a survey, without sums of pairs", "let the job run to its end");
        }
        return MomentFitting.fit(moments, settings, context.progress().part(0.5, 1));
    }
}
