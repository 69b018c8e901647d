package org.modestead.nodes.fit;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Progress;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.prepare.RecordingRows;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Fits a step map to a table of any length without holding it. */
public final class StreamingFitNode implements Node {

    private static final double READ = 0.9;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("streaming-fit", "Streaming Fit", NodeDeclaration.Stage.FIT,
                "Fits the map of one step to a table that is larger than memory, reading its rows once.",
                description(), List.of(
                        "Williams, Kevrekidis and Rowley, A data-driven approximation of the Koopman operator, Journal of Nonlinear Science"
                                + " 25:1307, 2015",
                        "Rahimi and Recht, Random features for large-scale kernel machines, Advances in Neural Information Processing Systems"
                                + " 20:1177, 2007",
                        "Williams and Seeger, Using the Nyström method to speed up kernel machines, Advances in Neural Information Processing"
                                + " Systems 13:682, 2001",
                        "Chan, Golub and LeVeque, Algorithms for computing the sample variance, The American Statistician 37:242, 1983",
                        "Cohen and Kaplan, Summarizing data using bottom-k sketches, Principles of Distributed Computing 2007"),
                List.of("out of core", "large", "big data", "one pass", "stream", "moments", "random features", "landmarks"),
                List.of(Port.of(StreamSettings.TABLE, PortType.TABLE, "Table", "Logged samples, one row a time, in order of run and time.")),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Stretches that were kept, of what trains and of what the fit"
                        + " never saw, for the steps that look at the recording."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator, of all rows that train."),
                        Port.table("fit", "Fit", "What was fitted and how well it is conditioned.", MomentFitting.TABLE),
                        Port.table("summary", "Summary", "What was found in the table and kept of it.", MomentFitting.TABLE)),
                StreamSettings.declared(), 1);
    }

    private static String description() {
        return """
                Does what the Snapshot Builder and the Operator Fitter do together, for tables of which only a part fits into memory. Rows are \
                read one after the other; what stays are sums over pairs of states, products of the functions now and one step later, and a \
                random sample of stretches. From the sums come the same figures as from a fit in memory, to about ten digits.

                Take it when the recording is too large; otherwise the Snapshot Builder can do more: resample, interpolate, smooth, weight \
                runs and separate inputs. Here rows must be evenly spaced but for gaps, in order of run and time. A query step with ORDER BY \
                brings other tables into order, on disk where memory is short.

                The coordinates need one pass. Monomials and random waves need one before it where channels are centred or scaled, and landmarks \
                always do, to choose among the states of all runs.

                Later steps look at what was kept: the size of modes, their intervals, residuals on what the fit never saw, forecasts from \
                the ends of kept stretches. Intervals are therefore as wide as for a recording of the kept length, and say so.

                Cost: rows times functions squared; memory does not grow with the rows. Switch the copy of the table off at its source.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return StreamSettings.problems(settings);
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Optional<TableSchema> schema = Optional.ofNullable(inputs.tables().get(StreamSettings.TABLE));
        Map<String, Outlook> values = schema.<Map<String, Outlook>>map(found -> {
            Outlook outlook = new Outlook(channels(found, settings), List.of(), Optional.empty());
            return Map.of("snapshots", outlook, "operator", outlook);
        }).orElse(Map.of());
        return new Expected(Map.of(), values);
    }

    private static List<Channel> channels(TableSchema schema, Settings settings) {
        return RecordingRows.channels(schema, settings.text(StreamSettings.TIME), settings.text(StreamSettings.RUN),
                settings.texts(StreamSettings.CHANNELS), StreamSettings.units(settings));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        RecordingRows rows = RecordingRows.of(inputs.get(StreamSettings.TABLE, Table.class), settings.text(StreamSettings.TIME),
                settings.text(StreamSettings.TIME_UNIT).strip(), settings.text(StreamSettings.RUN), settings.texts(StreamSettings.CHANNELS),
                StreamSettings.units(settings));
        TimeAxis axis = rows.axis();
        Progress progress = context.progress();
        StreamPlan asked = StreamSettings.plan(settings, rows.channels(), axis, 1);
        StreamedRows streamed = StreamedRows.of(rows, asked.pairReach(), progress);
        StreamPlan plan = StreamSettings.needsScale(settings) ? StreamSettings.plan(settings, rows.channels(), axis, streamed.scale(asked)) : asked;
        Moments moments = streamed.moments(plan, progress.part(0, READ));
        return MomentFitting.fit(moments, settings, progress.part(READ, 1));
    }
}
