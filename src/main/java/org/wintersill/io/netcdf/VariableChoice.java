package org.wintersill.io.netcdf;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.ForcingVariable;

/**
 * Chooses the variable that holds the wanted daily quantity: the one that the run file names, else the one whose standard
 * name and cell methods say it, else the one of a usual name. A variable that says to be something else is never taken.
 */
final class VariableChoice {
    private static final Set<String> MINIMUM = Set.of("tasmin", "tn", "tmin", "t2min", "tmn", "mn2t");
    private static final Set<String> MAXIMUM = Set.of("tasmax", "tx", "tmax", "t2max", "tmx", "mx2t");
    private static final Set<String> MEAN = Set.of("tas", "tg", "tmean", "tavg", "t2mean");

    private final CdfHeader header;
    private final ForcingVariable forcing;
    private final List<CdfVariable> candidates;

    VariableChoice(CdfHeader header, ForcingVariable forcing) {
        this.header = header;
        this.forcing = forcing;
        Set<String> bounds = header.all().stream()
                .flatMap(v -> java.util.stream.Stream.of(v.text("bounds"), v.text("climatology")))
                .flatMap(Optional::stream).collect(Collectors.toSet());
        this.candidates = header.all().stream().filter(v -> v.rank() >= 2 && v.type().isNumeric())
                .filter(v -> !bounds.contains(v.name()) && !Horizontal.isTwoDimensionalCoordinate(v)).toList();
    }

    private static Set<String> names(ForcingVariable forcing) {
        return switch (forcing) {
            case MINIMUM -> MINIMUM;
            case MAXIMUM -> MAXIMUM;
            case MEAN -> MEAN;
        };
    }

    private boolean hasUsualName(CdfVariable v) {
        return names(forcing).contains(v.name().toLowerCase(Locale.ROOT));
    }

    private List<String> methods(CdfVariable v) {
        return v.text("cell_methods").map(text -> CellMethods.overTime(text, timeDimension(v))).orElse(List.of());
    }

    private String timeDimension(CdfVariable v) {
        return v.dimensions().stream().filter(d -> AxisRole.of(header, d) == AxisRole.TIME).findFirst().orElse("time");
    }

    CdfVariable choose(Optional<String> requested, Notices notices) {
        if (requested.isPresent()) {
            return named(requested.get(), notices);
        }
        List<CdfVariable> sure = candidates.stream().filter(v -> v.word("standard_name").equals("air_temperature")
                && CellMethods.agree(methods(v), forcing)).toList();
        if (sure.size() > 1) {
            List<CdfVariable> usual = sure.stream().filter(this::hasUsualName).toList();
            sure = usual.size() == 1 ? usual : sure;
        }
        if (sure.size() == 1) {
            return sure.get(0);
        }
        if (sure.size() > 1) {
            throw refusal("Several variables are a daily " + forcing.word() + " temperature");
        }
        List<CdfVariable> usual = candidates.stream().filter(this::hasUsualName)
                .filter(v -> methods(v).isEmpty() || CellMethods.agree(methods(v), forcing)).toList();
        if (usual.size() == 1) {
            if (methods(usual.get(0)).isEmpty()) {
                notices.add("Variable '" + usual.get(0).name() + "' was chosen by its name; it does not say (cell_methods) that"
                        + " it is a daily " + forcing.word());
            }
            return usual.get(0);
        }
        throw refusal(usual.isEmpty() ? "No variable says that it is a daily " + forcing.word() + " temperature"
                : "Several variables have the name of a daily " + forcing.word() + " temperature");
    }

    private CdfVariable named(String requested, Notices notices) {
        CdfVariable found = candidates.stream().filter(v -> v.name().equals(requested)).findFirst()
                .or(() -> candidates.stream().filter(v -> v.name().equalsIgnoreCase(requested)).findFirst())
                .orElseThrow(() -> {
                    Optional<String> near = NearestName.of(requested, candidates.stream().map(CdfVariable::name).toList());
                    return refusal("There is no variable '" + requested + "'"
                            + near.map(n -> "; did you mean '" + n + "'?").orElse(""));
                });
        List<String> methods = methods(found);
        if (!methods.isEmpty() && !CellMethods.agree(methods, forcing)) {
            throw Problem.input("The variable is no daily " + forcing.word() + ": its cell_methods say '"
                    + found.text("cell_methods").orElse("") + "'", CdfProblems.at(header.path(), found.name()),
                    "Name another variable, or correct cell_methods if they are wrong").asException();
        }
        if (methods.isEmpty()) {
            notices.add("Variable '" + found.name() + "' was named in the run file; it does not say (cell_methods) that it is a"
                    + " daily " + forcing.word());
        }
        return found;
    }

    private ProblemException refusal(String reason) {
        String what = reason;
        String list = candidates.stream().limit(12).map(v -> v.name() + v.text("cell_methods").map(m -> " (" + m + ")")
                .orElse(v.text("units").map(u -> " (" + u + ")").orElse(""))).collect(Collectors.joining(", "));
        String undecoded = header.all().stream().filter(v -> v.storage() instanceof Storage.Unreadable u
                && u.reason().equals(HdfHeader.UNDECODED)).map(CdfVariable::name).collect(Collectors.joining(", "));
        if (!undecoded.isEmpty()) {
            what += "; the description of " + undecoded + " cannot be decoded";
        }
        String has = candidates.isEmpty() ? "; the file has no gridded variable in its root group" : "; the file has: " + list;
        return Problem.input(what + has, header.path().toString(),
                candidates.isEmpty() ? "Check that it is the right file" : "Name the right one with variable").asException();
    }
}
