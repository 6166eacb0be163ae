package org.wintersill.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.wintersill.engine.CancelledException;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** Builds the command line and turns whatever goes wrong into sentences and exit codes. */
final class Shell {
    private static final int HELP_WIDTH = 100;

    private final Session session;

    Shell(Session session) {
        this.session = session;
    }

    /** Does what the arguments say; never throws an exception, and returns the exit code. */
    int execute() {
        try {
            int code = commandLine().execute(session.arguments().toArray(String[]::new));
            session.out().flush();
            if (session.out().checkError() && code == ExitCode.DONE) {
                session.err().println("error: the result could not be written to standard output.");
                return ExitCode.OUTPUT;
            }
            return code;
        } catch (OutOfMemoryError e) {
            return outOfMemory();
        } catch (Error e) {
            return internal(e);
        }
    }

    private int outOfMemory() {
        session.err().println("error: Java ran out of memory.");
        session.err().println("  remedy: Give it more, such as java -Xmx4g -jar wintersill.jar, or lower --memory.");
        return ExitCode.LIMIT;
    }

    private CommandLine commandLine() {
        CommandLine line = new CommandLine(new WintersillCommand());
        line.addSubcommand(new MapCommand(session)).addSubcommand(new PlanCommand(session))
                .addSubcommand(new InspectCommand(session)).addSubcommand(new ExplainCommand(session))
                .addSubcommand(new CurvesCommand(session))
                .addSubcommand(new CompareCommand(session)).addSubcommand(new ParcelsCommand(session))
                .addSubcommand(new ManualCommand(session));
        line.setExpandAtFiles(false).setAbbreviatedOptionsAllowed(false).setAbbreviatedSubcommandsAllowed(false)
                .setInterpolateVariables(false).setColorScheme(CommandLine.Help.defaultColorScheme(Ansi.OFF))
                .setOut(new PrintWriter(session.out(), true, StandardCharsets.UTF_8))
                .setErr(new PrintWriter(session.err(), true, StandardCharsets.UTF_8))
                .setExecutionExceptionHandler((problem, command, parsed) -> failed(problem, command))
                .setParameterExceptionHandler((problem, arguments) -> misunderstood(problem));
        describe(line.getCommandSpec());
        line.getSubcommands().values().forEach(command -> describe(command.getCommandSpec()));
        return line;
    }

    private static void describe(CommandSpec spec) {
        spec.usageMessage().width(HELP_WIDTH).sortOptions(false).exitCodeListHeading("%nExit codes:%n")
                .exitCodeList(ExitCode.meanings()).optionListHeading("%nOptions:%n").parameterListHeading("%n")
                .commandListHeading("%nCommands:%n").descriptionHeading("%n").synopsisHeading("%nUsage: ");
        spec.version("wintersill " + Version.text());
    }

    private int failed(Exception failure, CommandLine command) {
        Manners manners = command.getCommandSpec().userObject() instanceof Manners.Kept kept ? kept.manners() : new Manners();
        Console console = session.console(manners);
        if (session.cancellation().getAsBoolean() || failure instanceof CancelledException) {
            console.error("interrupted; unfinished files are removed.");
            return ExitCode.INTERRUPTED;
        }
        if (failure instanceof ProblemException problem) {
            problem.problems().forEach(console::problem);
            if (problem.problems().size() > 1) {
                session.err().println(problem.problems().size() + " problems in all.");
            }
            if (manners.debug) {
                problem.printStackTrace(session.err());
            }
            return problem.exitCode();
        }
        for (Throwable cause = failure.getCause(); cause != null; cause = cause.getCause()) {
            if (cause instanceof OutOfMemoryError) {
                return outOfMemory();
            }
        }
        return internal(failure);
    }

    private int internal(Throwable failure) {
        session.err().println("error: the program made a mistake (" + failure.getClass().getSimpleName() + "), version "
                + Version.text() + ".");
        session.err().println("  remedy: Please report it, with the command and the lines below.");
        failure.printStackTrace(session.err());
        return ExitCode.INTERNAL;
    }

    private int misunderstood(ParameterException failure) {
        CommandLine command = failure.getCommandLine();
        Problem problem = failure instanceof UnmatchedArgumentException unmatched ? unmatched(unmatched)
                : Problem.usage(plain(failure.getMessage()), "", "");
        Console console = session.console(new Manners());
        String help = command.getCommandSpec().qualifiedName() + " --help tells what is accepted";
        console.problem(Problem.usage(problem.what(), problem.where(),
                problem.remedy().isEmpty() ? help : problem.remedy()));
        return ExitCode.USAGE;
    }

    private static Problem unmatched(UnmatchedArgumentException failure) {
        String argument = failure.getUnmatched().get(0);
        CommandSpec spec = failure.getCommandLine().getCommandSpec();
        boolean root = spec.parent() == null;
        if (argument.startsWith("-") && argument.length() > 1) {
            List<String> known = new ArrayList<>(spec.optionsMap().keySet());
            int equals = argument.indexOf('=');
            String name = equals < 0 ? argument : argument.substring(0, equals);
            Optional<String> near = NearestName.of(name, known);
            return Problem.usage("there is no flag " + name + (root ? "" : " of " + spec.name()), "",
                    near.map(flag -> "Did you mean " + flag + "?").orElse(""));
        }
        if (root) {
            List<String> known = List.copyOf(spec.subcommands().keySet());
            return Problem.usage("there is no command '" + argument + "'; known are " + String.join(", ", known), "",
                    NearestName.of(argument, known).map(name -> "Did you mean " + name + "?").orElse(""));
        }
        return Problem.usage("the argument '" + argument + "' is not expected", "", "Only one run file can be given. If the shell "
                + "made several names of a pattern, put it in quotation marks: --minimum 'tmin-*.nc'");
    }

    private static String plain(String message) {
        String oneLine = String.valueOf(message).replaceAll("\\s+", " ").trim();
        return oneLine.isEmpty() ? oneLine : oneLine.substring(0, 1).toLowerCase(Locale.ROOT) + oneLine.substring(1);
    }
}
