package org.wintersill.hardiness;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.time.MonthDay;

/**
 * The parameters of a model in one entry of a cultivar file, or in one part of it, asked for key by key.
 *
 * <p>What is missing or cannot be used is reported with its line and comes back empty, so that reading goes on to the next mistake;
 * {@link #problems} tells whether anything was reported meanwhile. Keys that nobody asked for are reported at the end.
 */
public interface ModelParameters {

    /** The cultivar in messages. */
    String label();

    /** Form of the cultivar's tolerance curve; it says how a spread turns into distances of LT10 and LT90 from LT50. */
    ToleranceCurve tolerance();

    /** Where this part begins, such as {@code cultivars.yaml:12}. */
    String place();

    /** How many problems the file has so far. */
    int problems();

    boolean has(String key);

    /** A number that may be left out. */
    Optional<Double> number(String key, Quantity quantity);

    /** A number that must be there. */
    Optional<Double> required(String key, Quantity quantity);

    /** Exactly so many numbers, of a key that may be left out. */
    Optional<List<Double>> numbers(String key, int count, Quantity quantity);

    Optional<Integer> whole(String key, int lowest, int highest);

    /** A text that must be there. */
    Optional<String> requiredText(String key, String remedy);

    Optional<String> word(String key, List<String> accepted);

    /** A day of the year that exists in the calendars of the world, such as {@code 10-15}. */
    Optional<MonthDay> date(String key);

    /** Two days of the year. */
    Optional<List<MonthDay>> dates(String key);

    /** A part with keys of its own. */
    Optional<ModelParameters> section(String key);

    /** A part that must be there. */
    Optional<ModelParameters> requiredSection(String key, String remedy);

    /** The parts of a list that must be there; none after a problem. */
    List<ModelParameters> requiredRows(String key, String remedy);

    /** The keys of this part, in the order of the file, for parts whose keys are names of the user's. */
    List<String> names();

    /** Symbols of the literature and the keys that they are here, for the message about an unknown key. */
    void symbols(Map<String, String> keys);

    /** Reports a problem at a key; at the beginning of this part where the key is empty or not given. */
    void problem(String key, String what, String remedy);

    /** Says something that does not stop a run. */
    void notice(String text);
}
