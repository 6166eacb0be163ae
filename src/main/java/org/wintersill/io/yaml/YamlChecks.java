package org.wintersill.io.yaml;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.Pattern;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.time.MonthDay;

/**
 * Turns single values into what they should be. A value that is something else gives a problem with its place, its key, what
 * was found and what is accepted, and an empty answer, so that reading goes on to the next mistake.
 */
public final class YamlChecks {
    /** Numbers as the YAML 1.2 core schema writes them; infinities and NaN mean nothing here. */
    private static final Pattern NUMBER = Pattern.compile("[-+]?(\\.[0-9]+|[0-9]+(\\.[0-9]*)?)([eE][-+]?[0-9]+)?");
    private static final Pattern COMMA_NUMBER = Pattern.compile("[-+]?[0-9]+,[0-9]+");

    private static final Pattern LINE = Pattern.compile(":[0-9]+$");

    private final Problem.Kind kind;
    private final Problems problems;

    public YamlChecks(Problem.Kind kind, Problems problems) {
        this.kind = kind;
        this.problems = problems;
    }

    public Problems problems() {
        return problems;
    }

    /** Adds a problem at a value. */
    public void problem(YamlValue value, String key, String what, String remedy) {
        problem(value.place(), key, what, remedy);
    }

    /** Adds a problem at a place. */
    public void problem(String place, String key, String what, String remedy) {
        problems.add(new Problem(kind, what, where(place, key), remedy));
    }

    /** Place and key; the key alone says nothing more about a value from a flag. */
    public static String where(String place, String key) {
        return key.isEmpty() || !LINE.matcher(place).find() ? place : place + ", " + key;
    }

    /** A text that says something. */
    public Optional<String> text(YamlValue value, String key) {
        if (value instanceof YamlValue.Text text && !text.absent() && !text.text().isBlank()) {
            return Optional.of(text.text());
        }
        problem(value, key, "a text is needed, found " + found(value), "");
        return Optional.empty();
    }

    /** Whether the value is one word or text. */
    public static boolean isText(YamlValue value) {
        return value instanceof YamlValue.Text;
    }

    /** A number from {@code lowest} to {@code highest}; {@code accepted} says so in words. */
    public Optional<Double> number(YamlValue value, String key, double lowest, double highest, String accepted) {
        if (value instanceof YamlValue.Text text && NUMBER.matcher(text.text()).matches()) {
            double number = Double.parseDouble(text.text());
            if (number >= lowest && number <= highest) {
                return Optional.of(number == 0 ? 0.0 : number);
            }
            problem(value, key, text.text() + " is out of range; accepted: " + accepted, "");
            return Optional.empty();
        }
        String remedy = value instanceof YamlValue.Text text && COMMA_NUMBER.matcher(text.text()).matches()
                ? "Write " + text.text().replace(',', '.') + " with a point" : "";
        problem(value, key, found(value) + " is not a number; accepted: " + accepted, remedy);
        return Optional.empty();
    }

    /** A whole number from {@code lowest} to {@code highest}. */
    public Optional<Integer> whole(YamlValue value, String key, int lowest, int highest) {
        String accepted = "whole numbers from " + lowest + " to " + highest;
        return number(value, key, lowest, highest, accepted).filter(number -> {
            if (number != Math.rint(number)) {
                problem(value, key, found(value) + " is not whole; accepted: " + accepted, "");
                return false;
            }
            return true;
        }).map(Double::intValue);
    }

    /** {@code true} or {@code false}. */
    public Optional<Boolean> flag(YamlValue value, String key) {
        if (value instanceof YamlValue.Text text) {
            switch (text.text()) {
                case "true", "True", "TRUE" -> {
                    return Optional.of(true);
                }
                case "false", "False", "FALSE" -> {
                    return Optional.of(false);
                }
                default -> { }
            }
        }
        problem(value, key, found(value) + " is neither true nor false", "Write true or false");
        return Optional.empty();
    }

    /**
     * One of some words.
     *
     * @param later words that are kept for a later version
     */
    public Optional<String> word(YamlValue value, String key, List<String> accepted, List<String> later) {
        String list = accepted.size() == 1 ? "only " + accepted.get(0) + " is accepted" : "accepted: " + String.join(", ", accepted);
        if (value instanceof YamlValue.Text text) {
            if (accepted.contains(text.text())) {
                return Optional.of(text.text());
            }
            if (later.contains(text.text())) {
                problem(value, key, "'" + text.text() + "' is not known to this version; " + list, "");
                return Optional.empty();
            }
            problem(value, key, found(value) + " is not known; " + list, NearestName.of(text.text(), accepted)
                    .map(name -> "Did you mean " + name + "?").orElse(""));
            return Optional.empty();
        }
        problem(value, key, found(value) + " stands where a word is needed; " + list, "");
        return Optional.empty();
    }

    /** A month and day such as {@code 11-01}. */
    public Optional<MonthDay> monthDay(YamlValue value, String key) {
        return parsed(value, key, MonthDay::parse, "a month and day such as 11-01");
    }

    /** A text that a function understands; it throws {@link IllegalArgumentException} where it does not. */
    public <T> Optional<T> parsed(YamlValue value, String key, Function<String, T> parser, String accepted) {
        if (value instanceof YamlValue.Text text && !text.absent()) {
            try {
                return Optional.of(parser.apply(text.text()));
            } catch (IllegalArgumentException e) {
                problem(value, key, found(value) + " is not " + accepted, "");
                return Optional.empty();
            }
        }
        problem(value, key, found(value) + " is not " + accepted, "");
        return Optional.empty();
    }

    /** The items of a list; a single text counts as a list of one. */
    public List<YamlValue> items(YamlValue value, String key) {
        if (value instanceof YamlValue.Sequence sequence) {
            return sequence.items();
        }
        if (value instanceof YamlValue.Text) {
            return List.of(value);
        }
        problem(value, key, "a list is needed, found " + found(value), "");
        return List.of();
    }

    /** As many numbers as asked for; empty if there are more, fewer or wrong ones. */
    public Optional<List<Double>> numbers(YamlValue value, String key, int count, double lowest, double highest,
                                          String accepted) {
        if (!(value instanceof YamlValue.Sequence sequence) || sequence.items().size() != count) {
            String size = value instanceof YamlValue.Sequence sequence ? "a list of " + sequence.items().size() : found(value);
            problem(value, key, "a list of " + count + " numbers is needed, found " + size, "");
            return Optional.empty();
        }
        List<Double> numbers = new ArrayList<>();
        for (YamlValue item : sequence.items()) {
            number(item, key, lowest, highest, accepted).ifPresent(numbers::add);
        }
        return numbers.size() == count ? Optional.of(numbers) : Optional.empty();
    }

    /** The value in the words of a message. */
    public static String found(YamlValue value) {
        return value instanceof YamlValue.Text text && text.absent() ? "nothing" : value.describe();
    }
}
