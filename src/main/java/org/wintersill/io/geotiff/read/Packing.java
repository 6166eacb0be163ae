package org.wintersill.io.geotiff.read;

import java.util.Optional;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;

/**
 * How stored values of each band become temperatures: value = stored * scale + offset, in the unit.
 *
 * @param scale {@code [band]}
 * @param offset {@code [band]}
 */
record Packing(double[] scale, double[] offset, TemperatureUnit unit, String unitText) {

    static Packing of(TiffFile file, GdalMetadata metadata, int count, TemperatureRequest request) {
        double[] scale = numbers(file, metadata, "scale", count, request.scale(), 1);
        double[] offset = numbers(file, metadata, "offset", count, request.offset(), 0);
        TemperatureUnit own = null;
        String text = "";
        for (int band = 0; band < count; band++) {
            Optional<String> said = metadata.item("unittype", band);
            if (said.isPresent()) {
                TemperatureUnit unit = TemperatureUnit.parse(said.get()).orElseThrow(() -> file.refuse("The unit '" + said.get()
                        + "' of the file is no temperature unit that is known; K, degC and degF are", "Set the unit of the file with"
                        + " gdal_edit.py -units, or check that these are temperatures"));
                if (own != null && own != unit) {
                    throw file.refuse("The bands of the file have different units, " + own.symbol() + " and " + unit.symbol(), "Make them agree");
                }
                own = unit;
                text = said.get();
            }
        }
        if (own == null && request.unit().isEmpty()) {
            throw file.refuse("The file does not say in which unit its temperatures are; K, degC and degF are known",
                    "Set unit: to the unit of the values, such as unit: degC");
        }
        if (own != null && request.unit().isPresent() && request.unit().get() != own) {
            throw file.refuse("The file gives its unit as " + own.symbol() + ", the run file says unit: " + request.unit().get().symbol(),
                    "Take unit: out, or mend the file with gdal_edit.py -units");
        }
        return own == null ? new Packing(scale, offset, request.unit().get(), request.unit().get().symbol() + " (run file)")
                : new Packing(scale, offset, own, text);
    }

    private static double[] numbers(TiffFile file, GdalMetadata metadata, String role, int count, Optional<Double> given, double usual) {
        double[] out = new double[count];
        for (int band = 0; band < count; band++) {
            Optional<String> said = metadata.item(role, band);
            out[band] = said.map(text -> number(file, role, text)).orElse(given.orElse(usual));
            if (said.isPresent() && given.isPresent() && Math.abs(out[band] - given.get()) > 1e-9 * Math.abs(given.get()) + 1e-300) {
                throw file.refuse("The file gives the " + role + " " + said.get() + ", the run file says " + role + ": " + given.get(),
                        "Take " + role + ": out of the run file");
            }
        }
        return out;
    }

    private static double number(TiffFile file, String role, String text) {
        try {
            double value = Double.parseDouble(text);
            if (Double.isFinite(value) && (value != 0 || !role.equals("scale"))) {
                return value;
            }
        } catch (NumberFormatException e) {
            // told below
        }
        throw file.refuse("The " + role + " '" + text + "' of the file cannot be used", "Set it anew with gdal_edit.py -" + role);
    }

    /** Degrees Celsius of a stored value. */
    double celsius(int band, double stored) {
        return unit.toCelsius(stored * scale[band] + offset[band]);
    }

    boolean packed() {
        return java.util.Arrays.stream(scale).anyMatch(s -> s != 1) || java.util.Arrays.stream(offset).anyMatch(o -> o != 0);
    }
}
