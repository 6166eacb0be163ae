package org.wintersill.io.crs;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * One element of well-known text: a keyword with texts, numbers and further elements in brackets. The grammar is that
 * of OGC 01-009 (WKT 1) and OGC 18-010 (WKT 2), which is the same at this level.
 *
 * @param keyword in capitals
 * @param values texts, numbers and bare words between the brackets, in order, quotes removed
 * @param children elements between the brackets, in order
 */
record Wkt(String keyword, List<String> values, List<Wkt> children) {

    private static final int MOST_LEVELS = 40;
    private static final int MOST_LETTERS = 1 << 20;

    Optional<Wkt> child(String... keywords) {
        return children.stream().filter(c -> List.of(keywords).contains(c.keyword)).findFirst();
    }

    List<Wkt> all(String keyword) {
        return children.stream().filter(c -> c.keyword.equals(keyword)).toList();
    }

    String text(int index) {
        return index < values.size() ? values.get(index) : "";
    }

    /** @throws IllegalArgumentException when there is no finite number there */
    double numberAt(int index) {
        try {
            double value = Double.parseDouble(text(index));
            if (Double.isFinite(value)) {
                return value;
            }
        } catch (NumberFormatException e) {
            // reported below with the place
        }
        throw new IllegalArgumentException("'" + text(index) + "' in " + keyword + " is not a number");
    }

    /** The EPSG code of the element itself; 0 for none. */
    int epsg() {
        return child("AUTHORITY", "ID").filter(a -> a.text(0).equalsIgnoreCase("EPSG") && a.text(1).matches("[0-9]{1,9}"))
                .map(a -> Integer.parseInt(a.text(1))).orElse(0);
    }

    /** Lower case, letters and digits only: names compare equal across writers. */
    static String plain(String name) {
        return name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]", "");
    }

    /** Shortest decimal form that reads back as the same number, without exponent. */
    static String number(double value) {
        if (value == 0) {
            return "0";
        }
        return new BigDecimal(Double.toString(value)).stripTrailingZeros().toPlainString();
    }

    /** @throws IllegalArgumentException when the text is no WKT */
    static Wkt parse(String text) {
        if (text.length() > MOST_LETTERS) {
            throw new IllegalArgumentException("it has " + text.length() + " letters");
        }
        Cursor cursor = new Cursor(text);
        Wkt root = cursor.element(cursor.word(), 0);
        cursor.blanks();
        // ESRI puts a vertical system behind the horizontal one.
        if (!cursor.atEnd() && !text.substring(cursor.at).toUpperCase(Locale.ROOT).replaceAll("\\s", "").startsWith(",VERTCS")) {
            throw new IllegalArgumentException("text after the last bracket");
        }
        return root;
    }

    private static final class Cursor {
        private final String text;
        private int at;

        Cursor(String text) {
            this.text = text;
        }

        boolean atEnd() {
            return at >= text.length();
        }

        void blanks() {
            while (!atEnd() && (Character.isWhitespace(text.charAt(at)) || text.charAt(at) == 0 || text.charAt(at) == '\ufeff')) {
                at++;
            }
        }

        char next() {
            if (atEnd()) {
                throw new IllegalArgumentException("it ends within a bracket");
            }
            return text.charAt(at++);
        }

        /** A keyword, number or bare word. */
        String word() {
            blanks();
            int start = at;
            while (!atEnd() && "[](),\" \t\r\n".indexOf(text.charAt(at)) < 0) {
                at++;
            }
            if (start == at) {
                throw new IllegalArgumentException("no word at letter " + (start + 1));
            }
            return text.substring(start, at);
        }

        String quoted() {
            StringBuilder out = new StringBuilder();
            while (true) {
                char c = next();
                if (c != '"') {
                    out.append(c);
                } else if (!atEnd() && text.charAt(at) == '"') {
                    out.append('"');
                    at++;
                } else {
                    return out.toString();
                }
            }
        }

        Wkt element(String keyword, int level) {
            if (level > MOST_LEVELS) {
                throw new IllegalArgumentException("brackets nest too deep");
            }
            blanks();
            char open = next();
            if (open != '[' && open != '(') {
                throw new IllegalArgumentException("no bracket after " + keyword);
            }
            List<String> values = new ArrayList<>();
            List<Wkt> children = new ArrayList<>();
            while (true) {
                blanks();
                if (!atEnd() && text.charAt(at) == '"') {
                    at++;
                    values.add(quoted());
                } else {
                    String word = word();
                    blanks();
                    if (!atEnd() && (text.charAt(at) == '[' || text.charAt(at) == '(')) {
                        children.add(element(word, level + 1));
                    } else {
                        values.add(word);
                    }
                }
                blanks();
                char c = next();
                if (c == ']' || c == ')') {
                    return new Wkt(keyword.toUpperCase(Locale.ROOT), List.copyOf(values), List.copyOf(children));
                }
                if (c != ',') {
                    throw new IllegalArgumentException("'" + c + "' where a comma is due");
                }
            }
        }
    }
}
