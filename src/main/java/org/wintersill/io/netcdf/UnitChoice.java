package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.Optional;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;

/** Settles the unit and the packing of a temperature variable between file and run file, and tries them on a sample. */
final class UnitChoice {
    private static final String ACCEPTED = "accepted are K, degC and degF";
    /** Range of air temperatures that are believed, degrees Celsius (science: values outside are set aside). */
    static final double COLDEST = -90;
    static final double WARMEST = 60;

    private UnitChoice() {
    }

    static TemperatureUnit unit(Path path, CdfVariable variable, TemperatureRequest request, Notices notices) {
        Optional<String> text = variable.text("units");
        Optional<TemperatureUnit> own = text.flatMap(TemperatureUnit::parse);
        String where = CdfProblems.at(path, variable.name());
        if (own.isPresent() && request.unit().isPresent() && own.get() != request.unit().get()) {
            throw Problem.input("The variable has units '" + text.get() + "', the run file says " + request.unit().get().symbol(),
                    where, "Leave out unit, or correct the file").asException();
        }
        if (own.isEmpty() && request.unit().isPresent()) {
            notices.add("Unit " + request.unit().get().symbol() + " of variable '" + variable.name()
                    + "' was taken from the run file" + text.map(t -> "; the file says '" + t + "'").orElse(""));
            return request.unit().get();
        }
        return own.orElseThrow(() -> Problem.input(text.map(t -> "The variable has units '" + t + "'; " + ACCEPTED)
                .orElse("The variable has no units; " + ACCEPTED), where, "Give unit for these files in the run file")
                .asException());
    }

    static Packing packing(Path path, CdfVariable variable, TemperatureRequest request) {
        contradiction(path, variable, "scale_factor", "scale", request.scale());
        contradiction(path, variable, "add_offset", "offset", request.offset());
        Packing packing = Packing.of(variable, request.scale(), request.offset());
        if (!Double.isFinite(packing.scale()) || packing.scale() == 0 || !Double.isFinite(packing.offset())) {
            throw Problem.input("The packing makes no sense: factor " + packing.scale() + ", offset " + packing.offset(),
                    CdfProblems.at(path, variable.name()), "Correct scale_factor and add_offset").asException();
        }
        return packing;
    }

    private static void contradiction(Path path, CdfVariable variable, String attribute, String key, Optional<Double> wanted) {
        Optional<Double> own = variable.numbers(attribute).map(n -> n.values()[0]);
        if (own.isPresent() && wanted.isPresent() && !own.get().equals(wanted.get())
                && own.get().floatValue() != wanted.get().floatValue()) {
            throw Problem.input("The variable has " + attribute + " " + own.get() + ", the run file says " + key + " "
                    + wanted.get(), CdfProblems.at(path, variable.name()), "Leave out " + key + ", or correct the file")
                    .asException();
        }
    }

    /**
     * Refuses a unit that cannot be that of the values.
     *
     * @param sample values in the unit of the file, NaN where missing
     */
    static void refuseImplausible(Path path, CdfVariable variable, TemperatureUnit unit, float[] sample) {
        float[] valid = new float[sample.length];
        int count = 0;
        for (float value : sample) {
            if (!Float.isNaN(value)) {
                valid[count++] = value;
            }
        }
        if (count == 0) {
            return;
        }
        Arrays.sort(valid, 0, count);
        float median = valid[count / 2];
        double celsius = unit.toCelsius(median);
        if (!(celsius >= COLDEST && celsius <= WARMEST)) {
            String likely = unit != TemperatureUnit.KELVIN && median > 180 && median < 335 ? "; they look like K"
                    : unit == TemperatureUnit.KELVIN && median >= COLDEST && median <= WARMEST ? "; they look like degC" : "";
            throw Problem.input("The values do not fit the unit: their median is " + median + " " + unit.symbol() + likely,
                    CdfProblems.at(path, variable.name()), "Correct the units attribute, or give scale and offset if the values"
                    + " are packed").asException();
        }
    }
}
