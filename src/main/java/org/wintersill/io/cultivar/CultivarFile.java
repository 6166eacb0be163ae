package org.wintersill.io.cultivar;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.Status;
import org.wintersill.hardiness.Variants;
import org.wintersill.hardiness.model.HardinessModels;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlReader;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/**
 * Reads a cultivar file: a list of entries, bare or under the key {@code cultivars}.
 *
 * <p>An entry has {@code id}, {@code name}, {@code species}, {@code organ}, {@code model}, {@code source}, {@code status}, {@code tolerance}
 * (the form of the tolerance curve), {@code variants} and the parameters of its model. Id, model, source and status must be there. An
 * entry with {@code built-in} stands on a cultivar of {@link BuiltInCultivars}.
 */
public final class CultivarFile {
    /** Names that Windows keeps for devices. */
    private static final Set<String> DEVICE_NAMES = Set.of("con", "prn", "aux", "nul", "com1", "com2", "com3", "com4", "com5",
            "com6", "com7", "com8", "com9", "lpt1", "lpt2", "lpt3", "lpt4", "lpt5", "lpt6", "lpt7", "lpt8", "lpt9");
    /** The folder of the outputs that belong to no cultivar. */
    private static final String SHARED = "shared";
    private static final String PARCELS = "parcels";

    private final String file;
    private final Notices notices;
    private final Problems problems = new Problems();
    private final YamlChecks checks = new YamlChecks(Problem.Kind.INPUT, problems);
    private final BuiltInReference builtIn = new BuiltInReference(checks);
    private final Map<String, String> places = new HashMap<>();

    private CultivarFile(String file, Notices notices) {
        this.file = file;
        this.notices = notices;
    }

    /**
     * The cultivars of a file, in its order.
     *
     * @param notices told of values that are allowed but odd
     * @throws org.wintersill.problem.ProblemException with all problems of the file
     */
    public static List<Cultivar> read(Path file, Notices notices) {
        YamlValue tree = new YamlReader(Problem.Kind.INPUT).read(file);
        return new CultivarFile(file.toString(), notices).cultivars(tree);
    }

    /**
     * A cultivar that comes with the program.
     *
     * @param where what asked for it, such as {@code cultivars.use}
     * @throws org.wintersill.problem.ProblemException when there is none of that id, or it needs more than the program knows
     */
    public static Cultivar builtIn(String id, String where, Notices notices) {
        YamlValue.Mapping entry = BuiltInCultivars.mappings().get(id);
        if (entry == null) {
            throw Problem.usage("there is no built-in cultivar " + id, where, BuiltInCultivars.remedy(id)).asException();
        }
        if (BuiltInCultivars.list().stream().anyMatch(known -> known.id().equals(id) && !known.complete())) {
            throw Problem.usage("the built-in cultivar " + id + " has bud stages without dates", where, "Write a cultivar file with an entry "
                    + "built-in: " + id + " and dates: {full bloom: 04-12, ...} or degree-days: {base: 5, at: {full bloom: 250, ...}}").asException();
        }
        return new CultivarFile("built-in " + id, notices).cultivars(new YamlValue.Sequence(List.of(entry), entry.place())).get(0);
    }

    /**
     * The cultivars of several files, in order, no two with the same id.
     *
     * @throws org.wintersill.problem.ProblemException with all problems of all files
     */
    public static List<Cultivar> readAll(List<Path> files, Notices notices) {
        Problems problems = new Problems();
        List<Cultivar> all = new ArrayList<>();
        Map<String, Path> homes = new HashMap<>();
        for (Path file : files) {
            problems.attempt(() -> {
                for (Cultivar cultivar : read(file, notices)) {
                    Path other = homes.putIfAbsent(cultivar.id(), file);
                    if (other != null) {
                        problems.add(Problem.input("the cultivar id " + cultivar.id() + " is also used in " + other, file.toString(),
                                "Give one of the two another id"));
                    }
                    all.add(cultivar);
                }
            });
        }
        problems.throwIfAny();
        return List.copyOf(all);
    }

    private List<Cultivar> cultivars(YamlValue tree) {
        List<Cultivar> cultivars = new ArrayList<>();
        List<YamlValue> entries = entries(tree);
        for (YamlValue entry : entries) {
            cultivar(YamlSection.of(builtIn.writtenOut(entry), "", checks)).ifPresent(cultivars::add);
        }
        if (entries.isEmpty() && problems.isEmpty()) {
            problems.add(Problem.input("the file has no cultivar", file, "Write a list of cultivars under the key cultivars"));
        }
        problems.throwIfAny();
        return List.copyOf(cultivars);
    }

    private List<YamlValue> entries(YamlValue tree) {
        if (tree instanceof YamlValue.Sequence sequence) {
            return sequence.items();
        }
        YamlSection top = YamlSection.of(tree, "", checks);
        Optional<YamlValue> list = top.value("cultivars");
        if (list.isEmpty() && tree instanceof YamlValue.Mapping mapping && mapping.entries().containsKey("id")) {
            checks.problem(tree, "", "a list of cultivars is needed, found a single one", "Begin the entry with '- id:'");
            return List.of();
        }
        top.finish();
        if (list.isPresent() && !(list.get() instanceof YamlValue.Sequence)) {
            checks.problem(list.get(), "cultivars", "a list of cultivars is needed, found " + YamlChecks.found(list.get()),
                    "Begin each cultivar with '- id:'");
            return List.of();
        }
        return list.map(value -> ((YamlValue.Sequence) value).items()).orElse(List.of());
    }

    private Optional<Cultivar> cultivar(YamlSection entry) {
        int before = problems.all().size();
        Optional<String> id = entry.required("id", "Give every cultivar an id of lower-case letters, digits and hyphens")
                .flatMap(value -> checks.text(value, "id")).filter(text -> usable(text, entry));
        String label = id.orElse("cultivar");
        String name = entry.text("name").orElse(label);
        String species = entry.text("species").orElse("");
        String organ = entry.text("organ").orElse("");
        Optional<String> source = entry.required("source", "Say where the numbers of " + label + " come from, for example "
                + "source: own freezing tests 2021").flatMap(value -> checks.text(value, "source"));
        Optional<Status> status = entry.required("status", "Say how far the numbers of " + label + " can be relied on: "
                + String.join(", ", Status.words())).flatMap(value -> checks.word(value, "status", Status.words(), List.of()))
                .flatMap(Status::named);
        ToleranceCurve tolerance = entry.word("tolerance", ToleranceCurve.keys(), List.of()).flatMap(ToleranceCurve::named)
                .orElse(ToleranceCurve.SPLIT_LOGISTIC);
        Variants variants = new VariantsReader(entry).read();
        YamlParameters parameters = new YamlParameters(entry, label, tolerance, notices);
        Optional<String> word = entry.required("model", "Write one of model: " + String.join(", ", HardinessModels.words()))
                .flatMap(value -> checks.word(value, "model", HardinessModels.words(), List.of()));
        Optional<HardinessModel> model = word.flatMap(kind -> HardinessModels.read(kind, parameters));
        if (word.isPresent()) {
            parameters.finish();
        }
        if (problems.all().size() > before) {
            return Optional.empty();
        }
        return Optional.of(new Cultivar(id.orElseThrow(), name, species, organ, source.orElseThrow(), status.orElseThrow(),
                model.orElseThrow(), tolerance, variants));
    }

    private boolean usable(String id, YamlSection entry) {
        if (!Cultivar.isId(id)) {
            String remedy = id.length() > Cultivar.LONGEST_ID ? "It has " + id.length() + " letters; keep it to "
                    + Cultivar.LONGEST_ID : suggestion(id);
            entry.problem("id", "'" + shown(id) + "' cannot be an id; accepted: lower-case letters, digits and single hyphens "
                    + "in between, at most " + Cultivar.LONGEST_ID, remedy);
            return false;
        }
        if (DEVICE_NAMES.contains(id) || id.equals(SHARED) || id.equals(PARCELS)) {
            entry.problem("id", "'" + id + "' cannot be an id, since the outputs of a cultivar go into a folder of that name and "
                    + (id.equals(SHARED) ? "this one holds the layers of no cultivar" : id.equals(PARCELS) ? "this one holds tables of parcels" : "Windows keeps it for a device"),
                    "Choose another id, such as " + id + "-1");
            return false;
        }
        String other = places.putIfAbsent(id, entry.place("id"));
        if (other != null) {
            entry.problem("id", "the id '" + id + "' is already used at " + other, "Give every cultivar an id of its own");
            return false;
        }
        return true;
    }

    private static String suggestion(String id) {
        String like = id.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-|-$", "");
        return Cultivar.isId(like) ? "Write " + like + " and keep the spelling for name" : "";
    }

    private static String shown(String id) {
        return id.length() <= 60 ? id : id.substring(0, 60) + "...";
    }
}
