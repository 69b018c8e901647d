package org.modestead.nodes.modelfile;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.StoredMoments;
import org.modestead.engine.moments.Moments;

/** Files of sums over snapshot pairs, in the form of model files: a job on other machines writes them, too. */
public final class MomentFiles {

    private static final String KIND = "moments";

    private MomentFiles() {}

    /**
     * @param out not closed
     * @throws IOException if the stream fails
     */
    public static void write(Moments moments, OutputStream out) throws IOException {
        ModelFile.write(KIND, StoredMoments.of(moments), out);
    }

    /**
     * @param in read to its end, not closed
     * @throws IOException if the stream fails
     * @throws ModelFileFault if what it gives is no such file, is broken or of a later version
     */
    public static Moments read(InputStream in) throws IOException {
        return ModelFile.read(KIND, in, StoredMoments::read);
    }
}
