package org.wintersill.run.parcels;

/** Builds an HTML page; texts from outside are escaped here and nowhere else. */
final class PageText {
    private final StringBuilder text = new StringBuilder();

    /** Markup of the program's own. */
    PageText raw(String markup) {
        text.append(markup);
        return this;
    }

    /** Words, whatever letters they have. */
    PageText words(String words) {
        text.append(escaped(words));
        return this;
    }

    /** An element with words in it. */
    PageText element(String name, String words) {
        return raw("<" + name + ">").words(words).raw("</" + name.split(" ")[0] + ">\n");
    }

    static String escaped(String words) {
        StringBuilder clean = new StringBuilder(words.length());
        words.codePoints().forEach(c -> {
            switch (c) {
                case '&' -> clean.append("&amp;");
                case '<' -> clean.append("&lt;");
                case '>' -> clean.append("&gt;");
                case '"' -> clean.append("&quot;");
                case '\'' -> clean.append("&#39;");
                default -> {
                    // Controls and marks that turn the direction of writing would let a name pretend to be something else.
                    boolean hidden = Character.isISOControl(c) || c >= 0x202a && c <= 0x202e || c >= 0x2066 && c <= 0x2069
                            || c >= 0xd800 && c <= 0xdfff;
                    clean.appendCodePoint(hidden ? ' ' : c);
                }
            }
        });
        return clean.toString();
    }

    @Override
    public String toString() {
        return text.toString();
    }
}
