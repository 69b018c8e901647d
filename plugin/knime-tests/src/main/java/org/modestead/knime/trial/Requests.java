package org.modestead.knime.trial;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;

/** What can be asked of the platform, by word. Nodes are named by their number in the workflow. */
final class Requests {

    private Optional<Project> open = Optional.empty();

    List<String> serve(String word, List<String> arguments) throws Exception {
        return switch (word) {
            case "offered" -> Offered.ids();
            case "description" -> Offered.description(arguments.get(0));
            case "create" -> {
                close();
                open = Optional.of(Project.create(Path.of(arguments.get(0))));
                yield List.of();
            }
            case "load" -> {
                close();
                Project.Loaded loaded = Project.load(Path.of(arguments.get(0)));
                open = Optional.of(loaded.project());
                yield List.of(loaded.complaint());
            }
            default -> inProject(word, arguments);
        };
    }

    private List<String> inProject(String word, List<String> arguments) throws Exception {
        Project project = open.orElseThrow(() -> new IllegalStateException("no workflow is open"));
        switch (word) {
            case "node" -> {
                return List.of(Integer.toString(project.add(arguments.get(0), arguments.get(1))));
            }
            case "link" -> project.link(number(arguments, 0), number(arguments, 1), number(arguments, 2), number(arguments, 3));
            case "set" -> project.set(number(arguments, 0), arguments.subList(1, arguments.size()));
            case "vary" -> {
                return List.of(project.vary(number(arguments, 0), arguments.subList(1, arguments.size())));
            }
            case "settings" -> {
                return List.of(project.settings(number(arguments, 0)));
            }
            case "dialog" -> {
                return List.of(project.dialog(number(arguments, 0)));
            }
            case "streamed" -> {
                return List.of(Integer.toString(project.streamed(arguments.stream().map(Integer::valueOf).toList())));
            }
            case "roles" -> {
                return project.roles(number(arguments, 0));
            }
            case "execute" -> project.executeAll();
            case "start" -> project.start(number(arguments, 0));
            case "await" -> {
                return List.of(Boolean.toString(project.await(number(arguments, 0), TimeUnit.SECONDS)));
            }
            case "cancel" -> {
                return List.of(Long.toString(project.cancel(number(arguments, 0))));
            }
            case "state" -> {
                return project.state(number(arguments, 0));
            }
            case "spec" -> {
                return project.spec(number(arguments, 0), number(arguments, 1));
            }
            case "object" -> {
                return project.object(number(arguments, 0), number(arguments, 1));
            }
            case "table" -> project.table(number(arguments, 0), number(arguments, 1), Path.of(arguments.get(2)));
            case "reset" -> project.reset(number(arguments, 0));
            case "reset-all" -> project.resetAll();
            case "save" -> project.save(Path.of(arguments.get(0)));
            default -> throw new IllegalArgumentException("there is no request " + word);
        }
        return List.of();
    }

    private void close() {
        open.ifPresent(Project::close);
        open = Optional.empty();
    }

    private static int number(List<String> arguments, int index) {
        return Integer.parseInt(arguments.get(index));
    }
}
