package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/** {@code plugin/DEPENDENCIES.md} tells of every dependency of the build: its version, its licence, whether it is shipped, and why it is there. */
class DependencyTableIT {

    /** What is not shipped: the table's word for how the poms use it. */
    private static final Map<String, String> WORDS = Map.of("build", "build", "provided", "platform", "test", "tests", "compile", "measuring", "runtime", "measuring");

    private static final List<Shipment> SHIPMENTS = Shipment.all();

    /** A dependency as the build has it. */
    private record Found(Set<String> versions, Set<String> places) {

        Found() {
            this(new TreeSet<>(), new TreeSet<>());
        }

        void add(String version, String place) {
            versions.add(version);
            places.add(place);
        }

        @Override
        public String toString() {
            return String.join(", ", versions) + " | " + String.join(", ", places);
        }
    }

    /** Returns all that ships, indirect dependencies too, by the lists of parts; and all else that a pom names. */
    private static Map<String, Found> build() throws IOException {
        Map<String, Found> build = new TreeMap<>();
        for (Shipment shipment : SHIPMENTS) {
            shipment.partsLists().values().forEach(list -> list.parts()
                    .forEach((name, part) -> build.computeIfAbsent(name, any -> new Found()).add(part.version(), shipment.name())));
        }
        Set<String> shipped = Set.copyOf(build.keySet());
        for (Pom pom : Pom.readAll(Path.of(System.getProperty("project.root")))) {
            pom.used().filter(used -> !used.name().startsWith("org.modestead:") && !shipped.contains(used.name()))
                    .forEach(used -> build.computeIfAbsent(used.name(), any -> new Found()).add(used.version(), WORDS.get(used.use())));
        }
        return build;
    }

    @Test
    void everyDependencyOfTheBuildIsInTheTableWithItsVersionAndPlaceAndNoOther() throws IOException {
        Map<String, String> told = new TreeMap<>();
        DependencyTable.read().rows().forEach((name, row) -> told.put(name, row.version() + " | " + row.place()));
        Map<String, String> found = new TreeMap<>();
        build().forEach((name, one) -> found.put(name, one.toString()));
        Set<String> differences = new TreeSet<>();
        found.forEach((name, one) -> {
            if (!told.containsKey(name)) {
                differences.add(name + " is in the build (" + one + ") and not in the table");
            } else if (!told.get(name).equals(one)) {
                differences.add(name + " is " + one + " in the build and " + told.get(name) + " in the table");
            }
        });
        told.keySet().stream().filter(name -> !found.containsKey(name)).forEach(name -> differences.add(name + " is in the table and not in the build"));
        assertTrue(found.size() > 50, "the build was not read: " + found.keySet());
        assertEquals(List.of(), List.copyOf(differences), "of plugin/DEPENDENCIES.md:\n" + String.join("\n", differences));
    }

    @Test
    void everyRowHasALicenceAndAReason() throws IOException {
        DependencyTable.read().rows().forEach((name, row) -> {
            assertTrue(row.licence().matches("[A-Za-z0-9.-]+(( WITH| OR| AND) [A-Za-z0-9.-]+)*"), name + ": " + row.licence());
            assertTrue(row.reason().length() > 10, name + ": " + row.reason());
        });
    }

    /** Where a library's own pom names licences by SPDX identifiers, the table tells one of them; whether later versions may be chosen is not read from there. */
    @Test
    void theTableTellsTheLicenceThatTheLibraryNames() throws IOException {
        Map<String, DependencyTable.Row> rows = DependencyTable.read().rows();
        for (Shipment shipment : SHIPMENTS) {
            shipment.partsLists().values().forEach(list -> list.parts().forEach((name, part) -> {
                List<String> identifiers = part.licences().stream().filter(licence -> licence.matches("[A-Za-z]+(-[A-Za-z0-9.]+)*")).toList();
                assertTrue(identifiers.isEmpty() || !rows.containsKey(name) || identifiers.stream().map(one -> one.replaceFirst("-(only|or-later)$", "")).anyMatch(rows.get(name).licence()::contains),
                        name + " names " + identifiers + ", the table " + rows.get(name).licence());
            }));
        }
    }
}
