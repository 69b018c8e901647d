package org.modestead.knime.port;

import java.io.ByteArrayOutputStream;
import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;
import org.modestead.engine.Fault;
import org.modestead.nodes.modelfile.PortFact;
import org.modestead.nodes.modelfile.PortFiles;

/**
 * A value with its spec. Two are equal when their files are: the format gives the same bytes for the same value.
 *
 * @param spec type and outlook
 * @param value of that type
 */
public record PortContent(StageSpec spec, Object value) {

    private static final String ENTRY = "value.zip";

    /** Checks that the value is of the type. */
    public PortContent {
        if (!spec.type().valueClass().isInstance(value)) {
            throw new IllegalArgumentException("a " + spec.type().title() + " port cannot carry a " + value.getClass().getSimpleName());
        }
    }

    /** Returns a few lines about the value. */
    public List<PortFact> facts() {
        return PortFiles.describe(spec.type(), value);
    }

    /** Returns one line about the value, for the tooltip. */
    String summary() {
        return spec.type().title() + ": " + facts().stream().map(fact -> fact.item() + " " + fact.value())
                .collect(Collectors.joining(", "));
    }

    void save(PortObjectZipOutputStream out) throws IOException {
        out.putNextEntry(Entries.named(ENTRY));
        PortFiles.write(spec.type(), value, out);
        out.closeEntry();
    }

    static PortContent load(PortObjectZipInputStream in, PortObjectSpec spec) throws IOException {
        if (!(spec instanceof StageSpec known)) {
            throw new IOException("A saved port has no spec of ours; run the node again.");
        }
        try {
            return new PortContent(known, PortFiles.read(known.type(), kept(Entries.open(in, ENTRY))));
        } catch (Fault unreadable) {
            throw new IOException(unreadable.getMessage(), unreadable);
        }
    }

    /** The platform closes its stream itself. */
    private static InputStream kept(InputStream in) {
        return new FilterInputStream(in) {
            @Override
            public void close() {
                // not ours
            }
        };
    }

    private byte[] bytes() {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            PortFiles.write(spec.type(), value, bytes);
        } catch (IOException impossible) {
            throw new UncheckedIOException(impossible);
        }
        return bytes.toByteArray();
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof PortContent content && spec.equals(content.spec)
                && (value == content.value || Arrays.equals(bytes(), content.bytes()));
    }

    @Override
    public int hashCode() {
        return spec.hashCode();
    }
}
