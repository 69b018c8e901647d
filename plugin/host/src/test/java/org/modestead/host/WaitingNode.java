package org.modestead.host;

import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;

/** A node that works until it is stopped: for tests that stop or kill the process. On the class path of tests only. */
public final class WaitingNode implements Node {

    private static final long LONGEST_SECONDS = 120;

    private final FakeNode node = new FakeNode("wait-for-stop", (inputs, settings, context) -> waitForStop(context));

    @Override
    public NodeDeclaration declaration() {
        return node.declaration();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        return node.run(inputs, settings, context);
    }

    private static double waitForStop(RunContext context) {
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(LONGEST_SECONDS);
        while (System.nanoTime() < end) {
            context.progress().checkCancelled();
            LockSupport.parkNanos(TimeUnit.MILLISECONDS.toNanos(1));
        }
        throw new IllegalStateException("nobody stopped the test");
    }
}
