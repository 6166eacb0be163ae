package org.wintersill.cli;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wintersill.config.InputFiles;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.ForcingVariable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code inspect}: how an input is understood. */
@Command(name = "inspect", header = "Show how input files are understood.",
        description = {"Tells variable, unit, calendar, days and gaps, grid and reference system, storage, and the range of a sample "
                + "of values. The flags say what a file does not say itself; they are the keys of the run file."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill inspect sample-grids/tmin-*.nc",
            "  wintersill inspect tmin_20191201.tif --unit degC --dates yyyyMMdd --crs EPSG:2056"})
final class InspectCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Parameters(arity = "1..*", paramLabel = "FILE", description = "Files, folders or patterns.")
    private List<String> files = new ArrayList<>();

    @Option(names = "--as", paramLabel = "QUANTITY", description = "What the files should hold: minimum (default), maximum or mean.")
    private String quantity = "minimum";

    @Option(names = "--variable", paramLabel = "NAME", description = "Variable to read, where several would qualify.")
    private String variable;

    @Option(names = "--unit", paramLabel = "UNIT", description = "Unit of the values: degC, K or degF.")
    private String unit;

    @Option(names = "--scale", paramLabel = "NUMBER", description = "Factor on stored values.")
    private String scale;

    @Option(names = "--offset", paramLabel = "NUMBER", description = "Added after the factor.")
    private String offset;

    @Option(names = "--dates", paramLabel = "PATTERN", description = "Pattern of the date in file names, such as yyyyMMdd.")
    private String dates;

    @Option(names = "--first-day", paramLabel = "DATE", description = "Date of the first band, such as 2019-12-01.")
    private String firstDay;

    @Option(names = "--member", paramLabel = "MEMBER", description = "Ensemble member, by number from 1 or by label.")
    private String member;

    @Option(names = "--crs", paramLabel = "CODE", description = "Reference system of files that carry none, such as EPSG:2056.")
    private String crs;

    @Option(names = "--json", description = "Answer with one JSON document.")
    private boolean json;

    @Mixin
    private Manners manners;

    InspectCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> session.commands().inspect(
                new InspectOptions(InputFiles.entry(forcing(), files, words()), json), console));
    }

    private ForcingVariable forcing() {
        List<String> accepted = Arrays.stream(ForcingVariable.values()).map(ForcingVariable::word).toList();
        return Arrays.stream(ForcingVariable.values()).filter(forcing -> forcing.word().equals(quantity)).findFirst()
                .orElseThrow(() -> Problem.usage("'" + quantity + "' is not known; accepted: "
                        + accepted.stream().collect(Collectors.joining(", ")), "--as", NearestName.of(quantity, accepted)
                        .map(name -> "Did you mean " + name + "?").orElse("")).asException());
    }

    private Map<String, String> words() {
        Map<String, String> words = new LinkedHashMap<>();
        words.put("variable", variable);
        words.put("unit", unit);
        words.put("scale", scale);
        words.put("offset", offset);
        words.put("dates", dates);
        words.put("first-day", firstDay);
        words.put("member", member);
        words.put("crs", crs);
        words.values().removeIf(value -> value == null);
        return words;
    }
}
