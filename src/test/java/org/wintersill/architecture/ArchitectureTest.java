package org.wintersill.architecture;

import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Holds the package table of DEVELOPERS.md. */
class ArchitectureTest {
    private static final String ROOT = "org.wintersill.";
    private static final JavaClasses CLASSES = new ClassFileImporter()
            .withImportOption(new ImportOption.DoNotIncludeTests()).importPackages("org.wintersill");

    /** Room and the rooms it may depend on; a room stands for its children too, and each may use itself. */
    private static final Map<String, Set<String>> MAY_USE = new LinkedHashMap<>();

    static {
        MAY_USE.put("problem", Set.of());
        MAY_USE.put("grid", Set.of());
        MAY_USE.put("time", Set.of("problem"));
        MAY_USE.put("temperature", Set.of("grid", "time", "problem"));
        MAY_USE.put("elevation", Set.of("grid", "time", "temperature", "problem"));
        MAY_USE.put("hardiness", Set.of("grid", "time", "temperature", "problem", "damage"));
        MAY_USE.put("damage", Set.of());
        MAY_USE.put("layer", Set.of("grid", "time", "problem"));
        MAY_USE.put("parcel", Set.of("grid", "problem"));
        MAY_USE.put("season", Set.of("grid", "time", "temperature", "hardiness", "damage", "layer", "problem"));
        MAY_USE.put("climatology", Set.of("grid", "time", "layer", "season", "damage", "problem"));
        MAY_USE.put("estimation", Set.of("time", "temperature", "hardiness", "season", "damage", "climatology", "problem"));
        MAY_USE.put("engine", Set.of("problem", "grid", "time", "temperature", "elevation", "hardiness", "damage", "layer", "season",
                "climatology"));
        MAY_USE.put("io", Set.of("problem", "grid", "time", "temperature", "elevation", "hardiness", "damage", "layer", "parcel"));
        MAY_USE.put("config", Set.of("problem", "grid", "time", "temperature", "elevation", "parcel", "scenario", "io"));
        MAY_USE.put("scenario", Set.of("grid", "time", "temperature", "elevation", "engine", "problem"));
        MAY_USE.put("comparison", Set.of("grid", "climatology", "problem"));
        MAY_USE.put("run", Set.of("problem", "grid", "time", "temperature", "elevation", "hardiness", "damage", "layer", "season", "estimation",
                "climatology", "engine", "parcel", "scenario", "comparison", "io", "config"));
        MAY_USE.put("cli", Set.of("config", "run", "engine", "problem", "io", "temperature", "time"));
    }

    private static final Set<String> THIRD_PARTY_ROOMS = Set.of("io", "config", "cli");
    private static final Set<String> SCIENCE = Set.of("grid", "time", "temperature", "elevation", "hardiness", "damage", "season",
            "climatology", "parcel");

    private static String room(String packageName) {
        if (!packageName.startsWith(ROOT)) {
            return "";
        }
        String rest = packageName.substring(ROOT.length());
        int dot = rest.indexOf('.');
        return dot < 0 ? rest : rest.substring(0, dot);
    }

    private static void eachDependency(java.util.function.BiConsumer<JavaClass, JavaClass> check) {
        for (JavaClass from : CLASSES) {
            from.getDirectDependenciesFromSelf().forEach(dependency -> {
                JavaClass to = dependency.getTargetClass().getBaseComponentType();
                check.accept(from, to);
            });
        }
    }

    private static void assertNone(Set<String> violations) {
        assertTrue(violations.isEmpty(), () -> String.join("\n", violations));
    }

    @Test
    void roomsUseOnlyWhatTheTableAllows() {
        Set<String> violations = new TreeSet<>();
        eachDependency((from, to) -> {
            String user = room(from.getPackageName());
            String used = room(to.getPackageName());
            if (!used.isEmpty() && !used.equals(user) && !MAY_USE.getOrDefault(user, Set.of()).contains(used)) {
                violations.add(from.getName() + " uses " + to.getName());
            }
        });
        assertNone(violations);
    }

    @Test
    void everyRoomIsInTheTable() {
        Set<String> unknown = new TreeSet<>();
        CLASSES.forEach(type -> {
            if (!MAY_USE.containsKey(room(type.getPackageName()))) {
                unknown.add(type.getName());
            }
        });
        assertNone(unknown);
    }

    @Test
    void foreignLibrariesStayAtTheEdges() {
        Set<String> violations = new TreeSet<>();
        eachDependency((from, to) -> {
            String name = to.getPackageName();
            boolean ours = name.startsWith("org.wintersill");
            boolean jdk = name.startsWith("java.") || name.startsWith("javax.xml") || name.startsWith("org.w3c") || name.isEmpty();
            boolean statistics = name.startsWith("org.apache.commons.math3") 
                    && Set.of("climatology", "estimation").contains(room(from.getPackageName()));
            if (!ours && !jdk && !statistics && !THIRD_PARTY_ROOMS.contains(room(from.getPackageName()))) {
                violations.add(from.getName() + " uses " + to.getName());
            }
        });
        assertNone(violations);
    }

    @Test
    void scienceTouchesNoFilesClocksOrRandomness() {
        Set<String> violations = new TreeSet<>();
        eachDependency((from, to) -> {
            String name = to.getName();
            boolean forbidden = name.startsWith("java.io.") && !name.equals("java.io.Serializable")
                    || name.startsWith("java.nio.file.Files") || name.startsWith("java.nio.channels")
                    || name.startsWith("java.util.logging") || name.equals("java.util.Random") || name.startsWith("java.time.Clock")
                    || name.equals("java.time.Instant");
            if (SCIENCE.contains(room(from.getPackageName())) && forbidden) {
                violations.add(from.getName() + " uses " + name);
            }
        });
        for (JavaClass type : CLASSES) {
            if (SCIENCE.contains(room(type.getPackageName()))) {
                type.getFields().stream().filter(field -> field.getModifiers().contains(JavaModifier.STATIC)
                        && !field.getModifiers().contains(JavaModifier.FINAL) && !field.getModifiers().contains(JavaModifier.SYNTHETIC))
                        .forEach(field -> violations.add("not final: " + field.getFullName()));
            }
        }
        assertNone(violations);
    }

    @Test
    void onlyTheCommandLinePrintsOrExits() {
        Set<String> violations = new TreeSet<>();
        for (JavaClass type : CLASSES) {
            if (room(type.getPackageName()).equals("cli")) {
                continue;
            }
            type.getFieldAccessesFromSelf().stream()
                    .filter(access -> access.getTarget().getFullName().matches("java\\.lang\\.System\\.(out|err)"))
                    .forEach(access -> violations.add(type.getName() + " prints"));
            type.getMethodCallsFromSelf().stream()
                    .filter(call -> call.getTarget().getFullName().startsWith("java.lang.System.exit"))
                    .forEach(call -> violations.add(type.getName() + " exits"));
        }
        assertNone(violations);
    }

    @Test
    void packagesHaveNoCycles() {
        Map<String, Set<String>> uses = new LinkedHashMap<>();
        eachDependency((from, to) -> {
            String user = room(from.getPackageName());
            String used = room(to.getPackageName());
            if (!used.isEmpty() && !used.equals(user)) {
                uses.computeIfAbsent(user, key -> new TreeSet<>()).add(used);
            }
        });
        Set<String> cycles = new TreeSet<>();
        uses.keySet().forEach(start -> follow(start, start, uses, new ArrayList<>(List.of(start)), cycles));
        assertNone(cycles);
    }

    private static void follow(String start, String at, Map<String, Set<String>> uses, List<String> path, Set<String> cycles) {
        for (String next : uses.getOrDefault(at, Set.of())) {
            if (next.equals(start)) {
                cycles.add(String.join(" > ", path) + " > " + start);
            } else if (!path.contains(next)) {
                path.add(next);
                follow(start, next, uses, path, cycles);
                path.remove(path.size() - 1);
            }
        }
    }

    @Test
    void everyPackageSaysWhatItIsFor() throws IOException {
        Set<String> violations = new TreeSet<>();
        Path sources = Path.of("src/main/java/org/wintersill");
        try (Stream<Path> folders = Files.walk(sources).filter(Files::isDirectory)) {
            for (Path folder : folders.toList()) {
                boolean hasClasses;
                try (Stream<Path> files = Files.list(folder)) {
                    hasClasses = files.anyMatch(file -> file.toString().endsWith(".java"));
                }
                Path info = folder.resolve("package-info.java");
                if (hasClasses) {
                    String text = Files.exists(info) ? Files.readString(info) : "";
                    for (String word : List.of("Purpose", "May depend on", "Conventions")) {
                        if (!text.contains("<b>" + word)) {
                            violations.add(folder + " does not say its " + word);
                        }
                    }
                }
            }
        }
        assertNone(violations);
    }

    @Test
    void filesReadInOneSittingAndNamesSaySomething() throws IOException {
        Set<String> violations = new TreeSet<>();
        try (Stream<Path> files = Files.walk(Path.of("src/main/java"))) {
            for (Path file : files.filter(path -> path.toString().endsWith(".java")).toList()) {
                if (Files.readAllLines(file).size() > 400) {
                    violations.add(file + " has more than 400 lines");
                }
                if (file.getFileName().toString().matches("(.*[a-z0-9])?(Util|Helper|Manager|Common|Misc|Base)s?\\.java")) {
                    violations.add(file + " has a name that says nothing");
                }
            }
        }
        assertNone(violations);
    }
}
