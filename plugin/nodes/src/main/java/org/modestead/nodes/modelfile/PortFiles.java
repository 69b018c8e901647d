package org.modestead.nodes.modelfile;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.Stored;
import org.modestead.engine.modelfile.StoredKernel;
import org.modestead.engine.modelfile.StoredModel;
import org.modestead.engine.modelfile.StoredOperator;
import org.modestead.engine.modelfile.StoredSnapshots;
import org.modestead.engine.modelfile.StoredSpectrum;
import org.modestead.engine.modelfile.StoredVerdict;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;

/**
 * Writes the value of a port to a stream and reads it back: what is computed from the value read back is the same, bit for bit. The same
 * value gives the same bytes.
 */
public final class PortFiles {

    private PortFiles() {}

    /**
     * Writes a value.
     *
     * @param type any but {@link PortType#TABLE}
     * @param value an instance of the type's class
     * @param out not closed
     * @throws IOException if the stream fails
     * @throws ModelFileFault if the value holds parts of another extension that have no form in a file
     */
    public static void write(PortType type, Object value, OutputStream out) throws IOException {
        ModelFile.write(kind(type), tree(type, type.valueClass().cast(value)), out);
    }

    /**
     * Reads a value.
     *
     * @param type that was written
     * @param in read to its end, not closed
     * @return an instance of the type's class
     * @throws IOException if the stream fails
     * @throws ModelFileFault if what it gives is no such file, is broken, of a later version, or needs what is not installed
     */
    public static Object read(PortType type, InputStream in) throws IOException {
        return ModelFile.read(kind(type), in, content -> value(type, content));
    }

    /**
     * Tells of which recording a stored model was made, without reading its arrays.
     *
     * @param in a file of type {@link PortType#MODEL}, read to the end of its index, not closed
     * @throws IOException if the stream fails
     * @throws ModelFileFault as {@link #read}, as far as the index tells
     */
    public static Outlook outlook(InputStream in) throws IOException {
        return ModelFile.peek(kind(PortType.MODEL), in, model -> model.object("operator", operator -> operator.object("snapshots", snapshots ->
                new Outlook(StoredSnapshots.readChannels(snapshots), StoredSnapshots.readInputs(snapshots),
                        Optional.of(StoredSnapshots.readTime(snapshots))))));
    }

    /** Returns what is to be known of a value at a glance, in reading order. */
    public static List<PortFact> describe(PortType type, Object value) {
        return PortFacts.of(type.valueClass().cast(value));
    }

    private static String kind(PortType type) {
        return type.name().toLowerCase(Locale.ROOT);
    }

    private static Stored.Fields tree(PortType type, Object value) {
        return switch (type) {
            case SNAPSHOTS -> StoredSnapshots.of((Snapshots) value);
            case KERNEL -> StoredKernel.of((Kernel) value);
            case OPERATOR -> StoredOperator.of((FittedOperator) value);
            case SPECTRUM -> StoredSpectrum.of((Spectrum) value);
            case VERDICT -> StoredVerdict.of((Verdict) value);
            case MODEL -> StoredModel.of((Model) value);
            case TABLE -> throw noTables();
        };
    }

    private static Object value(PortType type, FieldsReader content) {
        return switch (type) {
            case SNAPSHOTS -> StoredSnapshots.read(content);
            case KERNEL -> StoredKernel.read(content);
            case OPERATOR -> StoredOperator.read(content);
            case SPECTRUM -> StoredSpectrum.read(content);
            case VERDICT -> StoredVerdict.read(content);
            case MODEL -> StoredModel.read(content);
            case TABLE -> throw noTables();
        };
    }

    private static IllegalArgumentException noTables() {
        return new IllegalArgumentException("a table is kept by its host");
    }
}
