package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.http.Context;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.bench.work.Workbench;

/** Lists files of the opened folders, and of no others. */
final class FileRoutes {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    private static final int MOST = 1000;

    private final Workbench workbench;

    private final DeskFolder desks;

    FileRoutes(Workbench workbench, DeskFolder desks) {
        this.workbench = workbench;
        this.desks = desks;
    }

    void on(JavalinDefaultRoutingApi server) {
        server.get("/api/files", this::list);
    }

    private void list(Context context) throws IOException {
        OpenedFolders folders = workbench.folders();
        ObjectNode json = JSON.objectNode();
        ArrayNode roots = json.putArray("roots");
        folders.roots().forEach(root -> roots.addObject().put("path", root.toString()).put("title", root.toString()));
        String asked = context.queryParam("folder");
        ArrayNode entries = json.putArray("entries");
        if (asked == null || asked.isEmpty()) {
            Answer.json(context, json.putNull("folder").putNull("parent").put("cut", false));
            return;
        }
        Path folder = folders.inside(asked, folders.roots().get(0));
        if (!Files.isDirectory(folder)) {
            throw new RequestFault(404, "folder " + asked, "there is none of this name", "choose another one");
        }
        List<Path> inside;
        try (Stream<Path> found = Files.list(folder)) {
            inside = found.filter(path -> !path.getFileName().toString().startsWith(".")).filter(folders::holds).filter(path -> !desks.keepsBooksIn(path))
                    .sorted(Comparator.comparing((Path path) -> !Files.isDirectory(path)).thenComparing(path -> path.getFileName().toString())).toList();
        }
        Optional<Path> base = workbench.view().desk().map(DeskView.Open::workflow).map(workflow -> workflow.baseFolder());
        for (Path path : inside.subList(0, Math.min(MOST, inside.size()))) {
            boolean deeper = Files.isDirectory(path);
            entries.addObject().put("name", path.getFileName().toString()).put("path", path.toString()).put("folder", deeper)
                    .put("bytes", deeper ? 0 : path.toFile().length())
                    .put("relative", base.filter(path::startsWith).map(from -> from.relativize(path).toString().replace('\\', '/')).orElse(null));
        }
        Path parent = folder.getParent();
        json.put("folder", folder.toString()).put("parent", parent != null && folders.holds(parent) ? parent.toString() : null);
        Answer.json(context, json.put("cut", inside.size() > MOST));
    }
}
