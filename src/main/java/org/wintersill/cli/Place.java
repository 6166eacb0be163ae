package org.wintersill.cli;

import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.problem.Problem;

/** The place given to {@code explain}: two numbers with a comma between. */
record Place(double x, double y) {
    private static final String NUMBER = "\\s*([-+]?(?:[0-9]+(?:\\.[0-9]*)?|\\.[0-9]+)(?:[eE][-+]?[0-9]{1,3})?)\\s*";
    private static final Pattern FORM = Pattern.compile(NUMBER + "," + NUMBER);

    /** @param names what the numbers are, such as {@code X,Y} */
    static Place parse(String text, String flag, String names) {
        Matcher matcher = FORM.matcher(text);
        if (!matcher.matches()) {
            throw Problem.usage("'" + text + "' is not " + names, flag, "Give two numbers with points for decimals and one comma "
                    + "between them, such as " + flag + " 8.25,46.5").asException();
        }
        return new Place(Double.parseDouble(matcher.group(1)), Double.parseDouble(matcher.group(2)));
    }

    static Place lonLat(String text) {
        Place place = parse(text, "--at-lonlat", "LON,LAT");
        if (Math.abs(place.y) > 90 || place.x < -180 || place.x > 360) {
            boolean swapped = Math.abs(place.x) <= 90 && place.y >= -180 && place.y <= 360;
            throw Problem.usage("'" + text + "' is not on the globe: longitude comes first, then latitude from -90 to 90",
                    "--at-lonlat", swapped ? "Swapped? Then write --at-lonlat " + text.replaceAll("(.*),(.*)", "$2,$1") : "")
                    .asException();
        }
        return place;
    }
}
