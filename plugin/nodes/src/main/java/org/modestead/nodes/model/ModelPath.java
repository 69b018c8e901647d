package org.modestead.nodes.model;

import java.io.BufferedInputStream;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import org.modestead.engine.Progress;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.moments.Moments;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.files.InOneStep;
import org.modestead.nodes.modelfile.MomentFiles;
import org.modestead.nodes.modelfile.PortFiles;

/**
 * The file that a setting names.
 *
 * @param path absolute
 * @param shown as the person wrote it
 */
record ModelPath(Path path, String shown) {

    static final String SETTING = "file";
    static final String EXTENSION = "zip";
    private static final int BLOCK = 1 << 20;

    static ModelPath of(Settings settings, RunContext context) {
        String shown = settings.text(SETTING);
        return new ModelPath(context.baseFolder().resolve(shown).toAbsolutePath().normalize(), shown);
    }

    /** @throws ModelFileFault if there is nothing to read */
    void requireReadable() {
        if (Files.isDirectory(path)) {
            throw new ModelFileFault(shown, "this is a folder, not a file", "name a file in it");
        }
        if (!Files.exists(path)) {
            throw new ModelFileFault(shown, "there is no such file", "name a file relative to the workflow's folder or with its full path");
        }
        refuseDevices();
        if (!Files.isReadable(path)) {
            throw new ModelFileFault(shown, "the file may not be read", "allow reading it");
        }
    }

    /** @throws ModelFileFault if it cannot be written there */
    void requireWritable() {
        if (Files.isDirectory(path)) {
            throw new ModelFileFault(shown, "this is a folder, not a file", "name a file in it");
        }
        refuseDevices();
        Path folder = path.getParent();
        while (folder != null && !Files.exists(folder)) {
            folder = folder.getParent();
        }
        if (folder == null || !Files.isDirectory(folder) || !Files.isWritable(folder)) {
            throw new ModelFileFault(shown, "nothing can be written in the folder " + folder, "allow writing there or choose another folder");
        }
    }

    private void refuseDevices() {
        if (InOneStep.isNoFile(path)) {
            throw new ModelFileFault(shown, "this is a device or a pipe, not an ordinary file", "name an ordinary file");
        }
    }

    Model read(Progress progress) {
        return read(in -> (Model) PortFiles.read(PortType.MODEL, in), progress);
    }

    Moments readMoments(Progress progress) {
        return read(MomentFiles::read, progress);
    }

    /** Returns of which recording the model was made. */
    Outlook outlook() {
        return read(PortFiles::outlook, Progress.NONE);
    }

    private interface Reading<T> {
        T of(InputStream in) throws IOException;
    }

    private <T> T read(Reading<T> reading, Progress progress) {
        requireReadable();
        try (InputStream file = Files.newInputStream(path)) {
            return reading.of(new BufferedInputStream(PolledStreams.reading(file, Math.max(1, Files.size(path)), "reading " + shown, progress), BLOCK));
        } catch (ModelFileFault fault) {
            throw new ModelFileFault(shown + ", " + fault.where(), fault.seen(), fault.wanted());
        } catch (IOException unreadable) {
            throw new ModelFileFault(shown, "the file cannot be read (" + unreadable.getMessage() + ")", "see whether it opens elsewhere");
        }
    }

    /** Writes beside the place and moves there in one step: one that was there before stays until then. */
    void write(Model model, Progress progress) {
        requireWritable();
        try {
            InOneStep.make(path, part -> {
                try (OutputStream out = new BufferedOutputStream(PolledStreams.writing(Files.newOutputStream(part), progress), BLOCK)) {
                    PortFiles.write(PortType.MODEL, model, out);
                }
            });
        } catch (IOException unwritable) {
            throw new ModelFileFault(shown, "the file cannot be written (" + unwritable.getMessage() + ")",
                    "make room and allow writing, or choose another folder");
        }
    }
}
