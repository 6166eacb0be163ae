package org.wintersill.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.wintersill.io.file.NewFile;
import org.wintersill.problem.Problem;
import org.wintersill.run.curve.FitRequest;
import org.wintersill.time.SeasonWindow;
import org.wintersill.time.SeasonWindow.Hemisphere;
import picocli.CommandLine.Option;

/** The flags of {@code curves} about temperatures and trial fits. */
final class FitArguments {
    private static final double USUAL_LATITUDE = 45;
    private static final int MOST_REPLICATES = 100_000;

    @Option(names = "--fit", paramLabel = "FIELD.csv", description = "Measured lethal temperatures: a table with cultivar, date and lt50, "
            + "and where they are known lt10, lt90 and n, the number of organs in the sample.")
    private String field;

    @Option(names = "--model", paramLabel = "MODEL", description = "Model to fit: dated (rows of LT50 and the spreads), response or "
            + "thermal-time.")
    private String model;

    @Option(names = "--series", paramLabel = "SERIES.csv", description = "Daily temperatures of the place: a table with date, tmin and "
            + "tmax or tmean, degC.")
    private String series;

    @Option(names = "--daily-range", paramLabel = "K", description = "Tmax - Tmin for a series that has minima alone.")
    private String dailyRange;

    @Option(names = "--latitude", paramLabel = "DEGREES", description = "Latitude of the place, for models that ask for the length of the "
            + "night; 45 if nothing is said, -45 with --south.")
    private String latitude;

    @Option(names = "--out", paramLabel = "FILE.yaml", description = "Write the fitted cultivars into a cultivar file.")
    private String out;

    @Option(names = "--keep", paramLabel = "NAME=VALUE", description = "Do not estimate a parameter, such as tender-limit=-2. May be given "
            + "several times; the report names all parameters.")
    private List<String> kept = new ArrayList<>();

    @Option(names = "--replicates", paramLabel = "N", description = "Bootstrap replicates; 200 if nothing is said, 0 for no intervals.")
    private String replicates;

    @Option(names = "--interval", paramLabel = "SHARE", description = "Coverage of the two-sided intervals; 0.90 if nothing is said.")
    private String interval;

    @Option(names = "--seed", paramLabel = "N", description = "Seed of the bootstrap; 1 if nothing is said. The same seed gives the same "
            + "intervals.")
    private String seed;

    /** The fit that is asked for; a problem for flags that need --fit and do not have it. */
    Optional<FitRequest> request(SeasonWindow window) {
        if (field == null) {
            Map<String, Object> without = new LinkedHashMap<>();
            without.put("--model", model);
            without.put("--out", out);
            without.put("--keep", kept.isEmpty() ? null : kept);
            without.put("--replicates", replicates);
            without.put("--interval", interval);
            without.put("--seed", seed);
            without.forEach((flag, value) -> {
                if (value != null) {
                    throw Problem.usage(flag + " belongs to a trial fit", flag, "Add --fit FIELD.csv").asException();
                }
            });
            return Optional.empty();
        }
        if (model == null) {
            throw Problem.usage("the model of the trial fit is not said", "--model", "Add --model dated, response or thermal-time")
                    .asException();
        }
        return Optional.of(new FitRequest(RunArguments.path(field), series(), dailyRange(), model, window, latitude(window), kept(),
                (int) number("--replicates", replicates, 200, 0, MOST_REPLICATES), number("--interval", interval, 0.9, 0.01, 0.999),
                (long) number("--seed", seed, 1, 0, 1e15)));
    }

    Optional<Path> series() {
        return Optional.ofNullable(series).map(RunArguments::path);
    }

    OptionalDouble dailyRange() {
        return dailyRange == null ? OptionalDouble.empty() : OptionalDouble.of(number("--daily-range", dailyRange, 0, 0, 40));
    }

    double latitude(SeasonWindow window) {
        return number("--latitude", latitude, window.hemisphere() == Hemisphere.NORTH ? USUAL_LATITUDE : -USUAL_LATITUDE, -90, 90);
    }

    /** Where the cultivar file goes, checked. */
    Optional<Path> out(boolean overwrite) {
        Optional<Path> file = Optional.ofNullable(out).map(RunArguments::path);
        file.ifPresent(path -> NewFile.check(path, overwrite));
        return file;
    }

    private Map<String, Double> kept() {
        Map<String, Double> values = new LinkedHashMap<>();
        for (String assignment : kept) {
            int equals = assignment.indexOf('=');
            if (equals < 1) {
                throw Problem.usage("'" + assignment + "' is not NAME=VALUE", "--keep", "Write for example tender-limit=-2").asException();
            }
            values.put(assignment.substring(0, equals), number("--keep", assignment.substring(equals + 1), 0, -1e6, 1e6));
        }
        return values;
    }

    private static double number(String flag, String text, double usual, double lowest, double highest) {
        if (text == null) {
            return usual;
        }
        double value;
        try {
            value = Double.parseDouble(text);
        } catch (NumberFormatException e) {
            throw Problem.usage("'" + text + "' is not a number", flag, "").asException(e);
        }
        if (!(value >= lowest && value <= highest)) {
            throw Problem.usage(text + " is out of range; accepted: " + lowest + " to " + highest, flag, "").asException();
        }
        return value;
    }
}
