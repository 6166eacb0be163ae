package org.wintersill.cli;

import java.util.List;
import java.util.stream.Collectors;
import picocli.AutoComplete;
import picocli.CommandLine;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;

/** Scripts that complete the command line in the shells that people have. */
enum Completion {
    BASH {
        @Override
        String script(CommandLine program) {
            return AutoComplete.bash(program.getCommandName(), program);
        }
    },
    ZSH {
        @Override
        String script(CommandLine program) {
            String name = program.getCommandName();
            StringBuilder script = new StringBuilder("#compdef " + name + "\n_" + name + "() {\n  local -a commands\n  commands=(\n");
            each(program).forEach(command -> script.append("    ").append(quoted(command.name() + ":" + header(command))).append('\n'));
            script.append("  )\n  if (( CURRENT == 2 )); then\n    _describe command commands\n    return\n  fi\n  case ${words[2]} in\n");
            each(program).forEach(command -> script.append("    ").append(command.name()).append(") _arguments ")
                    .append(options(command).stream().map(Completion::zsh).collect(Collectors.joining(" "))).append(" '*:file:_files' ;;\n"));
            return script.append("  esac\n}\n_").append(name).append(" \"$@\"\n").toString();
        }
    },
    FISH {
        @Override
        String script(CommandLine program) {
            String start = "complete -c " + program.getCommandName();
            StringBuilder script = new StringBuilder();
            each(program).forEach(command -> script.append(start).append(" -n __fish_use_subcommand -a ").append(command.name()).append(" -d ")
                    .append(quoted(header(command))).append('\n'));
            each(program).forEach(command -> options(command).forEach(option -> script.append(start)
                    .append(" -n '__fish_seen_subcommand_from ").append(command.name()).append("' -l ")
                    .append(option.longestName().substring(2)).append(ManualPage.takesValue(option) ? " -r" : "").append(" -d ")
                    .append(quoted(first(option))).append('\n')));
            return script.toString();
        }
    };

    abstract String script(CommandLine program);

    private static List<CommandSpec> each(CommandLine program) {
        return program.getSubcommands().values().stream().map(CommandLine::getCommandSpec).toList();
    }

    private static List<OptionSpec> options(CommandSpec command) {
        return command.options().stream().filter(option -> option.longestName().startsWith("--")).toList();
    }

    private static String header(CommandSpec command) {
        return String.join(" ", command.usageMessage().header());
    }

    /** The first sentence of what an option does. */
    private static String first(OptionSpec option) {
        return String.join(" ", option.description()).replaceFirst("([.;:]) .*", "$1").replaceFirst("[.;:]$", "");
    }

    private static String zsh(OptionSpec option) {
        boolean value = ManualPage.takesValue(option);
        String words = first(option).replaceAll("[\\[\\]:]", "");
        return quoted("*" + option.longestName() + (value ? "=" : "") + "[" + words + "]" + (value ? ":" + option.paramLabel() + ":_files" : ""));
    }

    private static String quoted(String text) {
        return "'" + text.replace("'", "'\\''") + "'";
    }
}
