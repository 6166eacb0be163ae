package org.wintersill.config;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.time.MonthDay;
import org.wintersill.time.SeasonWindow;
import org.wintersill.time.SeasonWindow.Hemisphere;

/** Reads {@code winter}; the word {@code auto} leaves a value to the hemisphere. */
final class WinterSection {
    private static final String AUTO = "auto";
    private static final String RANGE = "two days such as 11-01..04-30";

    private WinterSection() {
    }

    private record Range(MonthDay from, MonthDay to) {
        static Range parse(String text) {
            String[] ends = text.split("\\.\\.", -1);
            if (ends.length != 2) {
                throw new IllegalArgumentException(text);
            }
            return new Range(MonthDay.parse(ends[0]), MonthDay.parse(ends[1]));
        }

        @Override
        public String toString() {
            return from + ".." + to;
        }
    }

    static WinterConfig read(YamlSection section, Map<String, Object> tree) {
        YamlChecks checks = section.checks();
        Optional<MonthDay> from = given(section, "from").flatMap(value -> checks.monthDay(value, section.path("from")));
        Optional<MonthDay> to = given(section, "to").flatMap(value -> checks.monthDay(value, section.path("to")));
        Optional<Range> complete = given(section, "complete")
                .flatMap(value -> checks.parsed(value, section.path("complete"), Range::parse, RANGE));
        Optional<Hemisphere> hemisphere = section.word("hemisphere", List.of("north", "south", AUTO), List.of())
                .filter(word -> !word.equals(AUTO)).map(word -> word.equals("north") ? Hemisphere.NORTH : Hemisphere.SOUTH);
        section.finish();
        if (from.isPresent() && to.isPresent() && complete.isPresent() && !new SeasonWindow(from.get(), to.get(),
                complete.get().from(), complete.get().to(), Hemisphere.NORTH).isConsistent()) {
            section.problem("complete", complete.get() + " is not inside the winter " + from.get() + " to " + to.get(),
                    "Give a part of the winter, such as " + from.get() + ".." + to.get());
        }
        tree.put("from", from.map(MonthDay::toString).orElse(AUTO));
        tree.put("to", to.map(MonthDay::toString).orElse(AUTO));
        tree.put("complete", complete.map(Range::toString).orElse(AUTO));
        tree.put("hemisphere", hemisphere.map(half -> half == Hemisphere.NORTH ? "north" : "south").orElse(AUTO));
        return new WinterConfig(from, to, complete.map(Range::from), complete.map(Range::to), hemisphere);
    }

    private static Optional<YamlValue> given(YamlSection section, String key) {
        return section.value(key).filter(value -> !(value instanceof YamlValue.Text text && text.text().equals(AUTO)));
    }
}
