package org.wintersill.cli;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.run.Caution;
import picocli.CommandLine;
import picocli.CommandLine.Model.ArgSpec;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;

/** The manual of the program in the mdoc language of man pages, made of the same words as {@code --help}. */
final class ManualPage {
    /** Letters a line, so that even with escapes it stays within a terminal's. */
    private static final int WIDTH = 70;

    private final StringBuilder page = new StringBuilder();

    private ManualPage() {
    }

    /** One page on the program and all its commands. */
    static String of(CommandLine program) {
        ManualPage manual = new ManualPage();
        manual.write(program);
        return manual.page.toString();
    }

    private void write(CommandLine program) {
        CommandSpec spec = program.getCommandSpec();
        line(".Dd $Mdocdate$");
        line(".Dt " + spec.name().toUpperCase(Locale.ROOT) + " 1");
        line(".Os");
        line(".Sh NAME");
        line(".Nm " + spec.name());
        line(".Nd " + lowerFirst(text(spec.usageMessage().header()).replaceFirst("\\.$", "")));
        line(".Sh SYNOPSIS");
        for (CommandLine command : commands(program)) {
            synopsis(spec.name(), command.getCommandSpec());
        }
        line(".Sh DESCRIPTION");
        paragraphs(spec.usageMessage().description());
        line(".Pp");
        line("Every command has the options below.");
        options(spec.options());
        line(".Sh COMMANDS");
        for (CommandLine command : commands(program)) {
            command(command.getCommandSpec(), spec.options());
        }
        line(".Sh EXIT STATUS");
        line(".Bl -tag -width Ds");
        new TreeMap<>(byNumber(ExitCode.meanings())).forEach((code, meaning) -> {
            line(".It " + code);
            prose(meaning);
        });
        line(".El");
        line(".Sh EXAMPLES");
        for (CommandLine command : commands(program)) {
            examples(command.getCommandSpec().usageMessage().footer());
        }
        line(".Sh CAVEATS");
        prose(Caution.SHORT);
    }

    private static Map<Integer, String> byNumber(Map<String, String> meanings) {
        Map<Integer, String> numbers = new TreeMap<>();
        meanings.forEach((code, meaning) -> numbers.put(Integer.valueOf(code.trim()), meaning));
        return numbers;
    }

    private static List<CommandLine> commands(CommandLine program) {
        return List.copyOf(program.getSubcommands().values());
    }

    private void synopsis(String name, CommandSpec command) {
        line(".Nm " + name);
        line(".Cm " + command.name());
        line(".Op Ar options");
        for (PositionalParamSpec parameter : command.positionalParameters()) {
            String ending = parameter.arity().max() > 1 ? " ..." : "";
            line((parameter.arity().min() == 0 ? ".Op Ar " : ".Ar ") + escaped(parameter.paramLabel()) + ending);
        }
    }

    private void command(CommandSpec spec, List<OptionSpec> common) {
        line(".Ss " + spec.name());
        paragraphs(spec.usageMessage().header());
        line(".Pp");
        paragraphs(spec.usageMessage().description());
        List<String> known = common.stream().map(OptionSpec::longestName).toList();
        line(".Bl -tag -width Ds");
        for (PositionalParamSpec parameter : spec.positionalParameters()) {
            line(".It Ar " + escaped(parameter.paramLabel()));
            paragraphs(parameter.description());
        }
        spec.options().stream().filter(option -> !known.contains(option.longestName())).forEach(this::option);
        line(".El");
    }

    private void options(List<OptionSpec> options) {
        line(".Bl -tag -width Ds");
        options.forEach(this::option);
        line(".El");
    }

    private void option(OptionSpec option) {
        StringBuilder names = new StringBuilder(".It");
        for (String name : option.names()) {
            names.append(names.length() > 3 ? " , " : " ").append("Fl ").append(escaped(name.substring(1)));
        }
        if (takesValue(option)) {
            names.append(" Ns = Ns Ar ").append(escaped(option.paramLabel()));
        }
        line(names.toString());
        paragraphs(option.description());
    }

    static boolean takesValue(ArgSpec option) {
        return option.arity().max() > 0;
    }

    private void examples(String[] footer) {
        line(".Bd -literal -offset indent");
        for (String example : footer) {
            line(escaped(example.strip()));
        }
        line(".Ed");
    }

    private void paragraphs(String[] texts) {
        for (String text : texts) {
            if (text.isEmpty()) {
                line(".Pp");
            } else {
                prose(text);
            }
        }
    }

    /** Each sentence on lines of its own, as the formatter wants them to space sentences, and none too long to be read. */
    private void prose(String text) {
        for (String sentence : text.split("(?<=[.?!]) (?=[A-Z])")) {
            StringBuilder row = new StringBuilder();
            for (String word : sentence.split(" ")) {
                if (row.length() > 0 && row.length() + word.length() >= WIDTH) {
                    line(escaped(row.toString()));
                    row.setLength(0);
                }
                row.append(row.length() == 0 ? "" : " ").append(word);
            }
            line(escaped(row.toString()));
        }
    }

    private static String text(String[] lines) {
        return String.join(" ", lines);
    }

    private static String lowerFirst(String text) {
        return text.isEmpty() ? text : text.substring(0, 1).toLowerCase(Locale.ROOT) + text.substring(1);
    }

    /** A text that the formatter takes as it stands: no escapes, and no line that begins as a request does. */
    private static String escaped(String text) {
        String safe = text.replace("\\", "\\e").replace("-", "\\-");
        return safe.startsWith(".") || safe.startsWith("'") ? "\\&" + safe : safe;
    }

    private void line(String text) {
        page.append(text).append('\n');
    }
}
