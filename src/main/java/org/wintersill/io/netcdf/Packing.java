package org.wintersill.io.netcdf;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * How stored numbers become values and which of them mean "missing" (CF conventions 1.8, sections 2.5.1 and 8.1;
 * NetCDF Users Guide, appendix A).
 *
 * <p>Fill values and missing values are compared raw, in the type of the file, before anything is unpacked. A valid range
 * is in packed units unless its type is that of the unpacked values. Where the file names no fill value, the default of
 * its type counts as missing.
 *
 * @param type type of the stored numbers, unsigned where the file says so
 * @param scale factor on stored numbers
 * @param offset summand after the factor
 * @param fills raw numbers that mean missing
 * @param lowest smallest valid raw number
 * @param highest largest valid raw number
 */
record Packing(RawType type, double scale, double offset, double[] fills, double lowest, double highest) {

    /**
     * @param scale factor for a variable that has none of its own
     * @param offset summand for a variable that has none of its own
     */
    static Packing of(CdfVariable variable, Optional<Double> scale, Optional<Double> offset) {
        RawType type = variable.saysUnsigned() ? variable.type().unsigned() : variable.type();
        double factor = variable.numbers("scale_factor").map(n -> n.values()[0]).orElse(scale.orElse(1.0));
        double summand = variable.numbers("add_offset").map(n -> n.values()[0]).orElse(offset.orElse(0.0));
        List<Double> fills = new ArrayList<>();
        Optional<CdfVariable.Numbers> fill = variable.numbers("_FillValue");
        fills.add(type.cast(fill.map(n -> n.values()[0]).orElse(type.defaultFill())));
        variable.numbers("missing_value").ifPresent(n -> {
            for (double value : n.values()) {
                // a fraction cannot be a stored integer: such files give the value as it is after unpacking
                boolean unpacked = type.isInteger() && value != Math.rint(value);
                fills.add(unpacked ? Math.rint((value - summand) / factor) : type.cast(value));
            }
        });
        double lowest = Double.NEGATIVE_INFINITY;
        double highest = Double.POSITIVE_INFINITY;
        Optional<CdfVariable.Numbers> range = variable.numbers("valid_range").filter(n -> n.values().length == 2);
        Optional<CdfVariable.Numbers> minimum = variable.numbers("valid_min");
        Optional<CdfVariable.Numbers> maximum = variable.numbers("valid_max");
        RawType unpackedType = variable.numbers("scale_factor").or(() -> variable.numbers("add_offset"))
                .map(CdfVariable.Numbers::type).orElse(type);
        if (range.isPresent()) {
            lowest = raw(range.get(), 0, variable, type, unpackedType, factor, summand);
            highest = raw(range.get(), 1, variable, type, unpackedType, factor, summand);
        } else {
            if (minimum.isPresent()) {
                lowest = raw(minimum.get(), 0, variable, type, unpackedType, factor, summand);
            }
            if (maximum.isPresent()) {
                highest = raw(maximum.get(), 0, variable, type, unpackedType, factor, summand);
            }
        }
        if (lowest > highest && factor < 0) {
            double swap = lowest;
            lowest = highest;
            highest = swap;
        }
        return new Packing(type, factor, summand, fills.stream().mapToDouble(Double::doubleValue).toArray(), lowest, highest);
    }

    /** A limit in raw units. */
    private static double raw(CdfVariable.Numbers limit, int index, CdfVariable variable, RawType type, RawType unpackedType,
                              double scale, double offset) {
        double value = limit.values()[index];
        boolean sameAsPacked = limit.type() == variable.type() || limit.type() == type;
        boolean ofUnpacked = !sameAsPacked && (limit.type() == unpackedType || type.isInteger() && !limit.type().isInteger());
        if (ofUnpacked && (scale != 1 || offset != 0)) {
            // half a step of slack: the limit itself must survive the round-off of being packed
            double raw = (value - offset) / scale;
            return type.isInteger() ? Math.rint(raw) : raw;
        }
        return limit.type() == variable.type() || !type.isInteger() ? type.cast(value) : value;
    }

    /** Whether a stored number means that there is no value. */
    boolean isMissing(double raw) {
        if (Double.isNaN(raw)) {
            return true;
        }
        for (double fill : fills) {
            if (raw == fill) {
                return true;
            }
        }
        return raw < lowest || raw > highest;
    }

    /** The same with one more stored number that means missing. */
    Packing withFill(double fill) {
        double[] more = java.util.Arrays.copyOf(fills, fills.length + 1);
        more[fills.length] = type.cast(fill);
        return new Packing(type, scale, offset, more, lowest, highest);
    }

    boolean isIdentity() {
        return scale == 1 && offset == 0;
    }

    /** One clause for people. */
    String describe() {
        return type.name().toLowerCase(java.util.Locale.ROOT) + (isIdentity() ? "" : " packed with factor " + scale
                + " and offset " + offset);
    }
}
