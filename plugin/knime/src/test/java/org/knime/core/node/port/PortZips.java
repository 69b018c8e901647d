package org.knime.core.node.port;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionMonitor;

/** Saves and loads a port as the platform does: spec and object each in a zip of its own. */
public final class PortZips {

    private PortZips() {}

    /** Returns the spec as it comes back. */
    public static <T extends PortObjectSpec> T again(final PortObjectSpec.PortObjectSpecSerializer<T> serializer, final T spec)
            throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (PortObjectSpecZipOutputStream out = new PortObjectSpecZipOutputStream(bytes)) {
            serializer.savePortObjectSpec(spec, out);
        }
        return serializer.loadPortObjectSpec(new PortObjectSpecZipInputStream(new ByteArrayInputStream(bytes.toByteArray())));
    }

    /** Returns the object as it comes back. */
    public static <T extends PortObject> T again(final PortObject.PortObjectSerializer<T> serializer, final T object)
            throws IOException, CanceledExecutionException {
        byte[] bytes = bytes(serializer, object);
        return serializer.loadPortObject(new PortObjectZipInputStream(new ByteArrayInputStream(bytes)), object.getSpec(),
                new ExecutionMonitor());
    }

    /** Returns the zip of an object. */
    public static <T extends PortObject> byte[] bytes(final PortObject.PortObjectSerializer<T> serializer, final T object)
            throws IOException, CanceledExecutionException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (PortObjectZipOutputStream out = new PortObjectZipOutputStream(bytes)) {
            serializer.savePortObject(object, out, new ExecutionMonitor());
        }
        return bytes.toByteArray();
    }
}
