package org.modestead.host.bench.folders;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;

/**
 * The folders that a person opened to the bench: nothing outside them is read, written or listed, whatever a workflow or a request
 * names. Links of the file system are followed before it is judged, so none leads out.
 *
 * @param roots absolute
 */
public record OpenedFolders(List<Path> roots) {

    /** Takes absolute, distinct copies. */
    public OpenedFolders {
        roots = roots.stream().map(root -> root.toAbsolutePath().normalize()).distinct().toList();
    }

    /** The same folders and one more. */
    public OpenedFolders and(Path more) {
        List<Path> all = new ArrayList<>(roots);
        all.add(more);
        return new OpenedFolders(all);
    }

    /** Returns whether a file lies inside, or would if it were there. */
    public boolean holds(Path file) {
        Path place = real(file.toAbsolutePath().normalize());
        return roots.stream().map(OpenedFolders::real).anyMatch(place::startsWith);
    }

    /**
     * Reads a name.
     *
     * @param name as written, absolute or relative to the folder
     * @param folder absolute
     * @throws FolderFault if it is no name of a file, or lies outside
     */
    public Path inside(String name, Path folder) {
        try {
            Path file = folder.resolve(name).toAbsolutePath().normalize();
            if (holds(file)) {
                return file;
            }
        } catch (InvalidPathException broken) {
            throw new FolderFault("file " + name, "this is no name of a file (" + broken.getReason() + ")", "give another name");
        }
        throw new FolderFault("file " + name, "it lies outside the opened folders", wanted());
    }

    /** Returns what to do about a file outside. */
    public String wanted() {
        return "put it into one of " + roots.stream().map(Path::toString).collect(Collectors.joining(", "))
                + ", or start the bench with --folder and its folder";
    }

    /** Follows the links of all parts of a name that are there. */
    private static Path real(Path file) {
        Path there = file;
        while (there != null && !Files.exists(there, java.nio.file.LinkOption.NOFOLLOW_LINKS)) {
            there = there.getParent();
        }
        try {
            return there == null ? file : there.toRealPath().resolve(there.relativize(file)).normalize();
        } catch (IOException dangling) {
            // a link that leads nowhere, or in a circle: its target is not known to be inside
            return Path.of("/").toAbsolutePath().getRoot();
        }
    }
}
