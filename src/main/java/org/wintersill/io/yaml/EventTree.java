package org.wintersill.io.yaml;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.snakeyaml.engine.v2.common.Anchor;
import org.snakeyaml.engine.v2.events.AliasEvent;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.wintersill.problem.Problem;

/**
 * Builds values from the events of the YAML parser, which itself does not recurse, so that depth, number and aliases are
 * limited before anything is built. Tags beyond the core schema are refused, as are merge keys by being unknown keys.
 */
final class EventTree {
    private static final int DEEPEST = 24;
    /** Counted with every alias written out, so that aliases of aliases cannot grow without bound. */
    private static final int MOST_VALUES = 200_000;
    private static final Set<String> CORE_TAGS = Set.of("tag:yaml.org,2002:str", "tag:yaml.org,2002:int",
            "tag:yaml.org,2002:float", "tag:yaml.org,2002:bool", "tag:yaml.org,2002:null", "tag:yaml.org,2002:seq",
            "tag:yaml.org,2002:map", "!");

    private final Iterator<Event> events;
    private final String name;
    private final Problem.Kind kind;
    private final Map<Anchor, YamlValue> anchors = new HashMap<>();
    private final Map<Anchor, int[]> anchorSizes = new HashMap<>();
    private int values;

    EventTree(Iterator<Event> events, String name, Problem.Kind kind) {
        this.events = events;
        this.name = name;
        this.kind = kind;
    }

    static String place(String name, int line) {
        return name.startsWith("--") ? name : name + ":" + line;
    }

    /** The only document; an empty mapping if there is none. */
    YamlValue document() {
        YamlValue value = null;
        while (events.hasNext()) {
            Event event = events.next();
            switch (event.getEventId()) {
                case DocumentStart -> {
                    if (value != null) {
                        throw problem("there is more than one document", event, "Keep one and remove the line ---");
                    }
                    value = value(events.next(), 0);
                }
                default -> { }
            }
        }
        return value == null ? YamlValue.Mapping.empty(name) : value;
    }

    private YamlValue value(Event event, int depth) {
        if (depth > DEEPEST) {
            throw problem("values are nested more than " + DEEPEST + " deep", event, "Check the brackets");
        }
        count(1, event);
        if (event instanceof AliasEvent alias) {
            YamlValue known = anchors.get(alias.getAlias());
            if (known == null) {
                throw problem("the alias *" + alias.getAlias().getValue() + " has no anchor before it", event,
                        "A text that begins with * (such as the pattern *.nc) needs quotation marks: '*.nc'");
            }
            count(anchorSizes.get(alias.getAlias())[0], event);
            if (depth + anchorSizes.get(alias.getAlias())[1] > DEEPEST) {
                throw problem("values are nested more than " + DEEPEST + " deep", event, "Use fewer aliases");
            }
            return known;
        }
        NodeEvent node = (NodeEvent) event;
        refuseTag(node);
        int before = values;
        YamlValue value = switch (event.getEventId()) {
            case Scalar -> scalar((ScalarEvent) event);
            case SequenceStart -> sequence(event, depth);
            case MappingStart -> mapping(event, depth);
            default -> throw problem("unexpected " + event.getEventId(), event, "");
        };
        node.getAnchor().ifPresent(anchor -> {
            anchors.put(anchor, value);
            anchorSizes.put(anchor, new int[] {values - before, height(value)});
        });
        return value;
    }

    private YamlValue scalar(ScalarEvent event) {
        return new YamlValue.Text(event.getValue(), !event.isPlain(), placeOf(event));
    }

    private YamlValue sequence(Event start, int depth) {
        List<YamlValue> items = new ArrayList<>();
        for (Event event = events.next(); event.getEventId() != Event.ID.SequenceEnd; event = events.next()) {
            items.add(value(event, depth + 1));
        }
        return new YamlValue.Sequence(items, placeOf(start));
    }

    private YamlValue mapping(Event start, int depth) {
        Map<String, YamlValue> entries = new LinkedHashMap<>();
        Map<String, String> places = new LinkedHashMap<>();
        for (Event event = events.next(); event.getEventId() != Event.ID.MappingEnd; event = events.next()) {
            YamlValue key = value(event, depth + 1);
            if (!(key instanceof YamlValue.Text text)) {
                throw problem("a key must be a text, this is " + key.describe(), event, "Check the brackets and the indentation");
            }
            YamlValue value = value(events.next(), depth + 1);
            if (entries.containsKey(text.text())) {
                throw problem("the key " + text.text() + " stands here and already at " + places.get(text.text()), event,
                        "Keep one of the two");
            }
            entries.put(text.text(), value);
            places.put(text.text(), text.place());
        }
        return new YamlValue.Mapping(entries, places, placeOf(start));
    }

    private void refuseTag(NodeEvent event) {
        Optional<String> tag = event instanceof ScalarEvent scalar ? scalar.getTag()
                : ((CollectionStartEvent) event).getTag();
        if (tag.isPresent() && !CORE_TAGS.contains(tag.get())) {
            throw problem("the tag " + tag.get() + " is not allowed", event, "Remove it; only plain texts, numbers, lists and maps "
                    + "are read, and a text that begins with ! needs quotation marks");
        }
    }

    private void count(int more, Event event) {
        values += more;
        if (values > MOST_VALUES) {
            throw problem("there are more than " + MOST_VALUES + " values, aliases written out", event, "Use fewer aliases");
        }
    }

    private static int height(YamlValue value) {
        if (value instanceof YamlValue.Sequence sequence) {
            return 1 + sequence.items().stream().mapToInt(EventTree::height).max().orElse(0);
        }
        if (value instanceof YamlValue.Mapping mapping) {
            return 1 + mapping.entries().values().stream().mapToInt(EventTree::height).max().orElse(0);
        }
        return 0;
    }

    private String placeOf(Event event) {
        return event.getStartMark().map(mark -> place(name, mark.getLine() + 1)).orElse(name);
    }

    private RuntimeException problem(String what, Event event, String remedy) {
        return new Problem(kind, what, placeOf(event), remedy).asException();
    }
}
