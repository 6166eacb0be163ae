package org.wintersill.temperature;

import java.util.Locale;
import java.util.Optional;

/**
 * Units in which files give temperature, and the linear change to degrees Celsius.
 * 0 degC = 273.15 K; t(degC) = (t(degF) - 32) / 1.8, both exact by definition.
 */
public enum TemperatureUnit {
    CELSIUS("degC", 1, 0), KELVIN("K", 1, -273.15), FAHRENHEIT("degF", 1 / 1.8, -32 / 1.8);

    private final String symbol;
    private final double factor;
    private final double shift;

    TemperatureUnit(String symbol, double factor, double shift) {
        this.symbol = symbol;
        this.factor = factor;
        this.shift = shift;
    }

    public String symbol() {
        return symbol;
    }

    /** Multiply by this, then add {@link #shift()}, to get degrees Celsius. */
    public double factor() {
        return factor;
    }

    public double shift() {
        return shift;
    }

    public double toCelsius(double value) {
        return switch (this) {
            case CELSIUS -> value;
            case KELVIN -> value - 273.15;
            case FAHRENHEIT -> (value - 32) / 1.8;
        };
    }

    /** Reads the spellings found in files; empty for anything else. */
    public static Optional<TemperatureUnit> parse(String text) {
        String plain = text.trim().toLowerCase(Locale.ROOT).replace("\u00b0", "deg").replace('_', ' ').replace(" ", "");
        return switch (plain) {
            case "degc", "c", "celsius", "degreesc", "degreec", "degreescelsius", "degreecelsius", "degcelsius", "cel" ->
                    Optional.of(CELSIUS);
            case "k", "kelvin", "degk", "degreesk", "degreek", "degreeskelvin", "degreekelvin", "kelvins" -> Optional.of(KELVIN);
            case "degf", "f", "fahrenheit", "degreesf", "degreef", "degreesfahrenheit", "degreefahrenheit" ->
                    Optional.of(FAHRENHEIT);
            default -> Optional.empty();
        };
    }
}
