package org.wintersill.cli;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code manual}: the man page, and scripts that complete the command line. */
@Command(name = "manual", header = "Print the man page, or a completion script for a shell.",
        description = {"The man page is in the mdoc language. Both expect the program to be called by its name: put a script called "
                + "wintersill on the path that runs java -jar wintersill.jar with its arguments."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill manual > wintersill.1 && man ./wintersill.1",
            "  wintersill manual --completion bash > ~/.local/share/bash-completion/completions/wintersill"})
final class ManualCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Spec
    private CommandSpec spec;

    @Option(names = "--completion", paramLabel = "SHELL", description = "Print the completion script of bash, zsh or fish instead.")
    private String shell;

    @Mixin
    private Manners manners;

    ManualCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> {
            console.result(shell == null ? ManualPage.of(spec.parent().commandLine())
                    : completion(shell).script(spec.parent().commandLine()));
            return ExitCode.DONE;
        });
    }

    private static Completion completion(String shell) {
        List<String> known = Arrays.stream(Completion.values()).map(script -> script.name().toLowerCase(Locale.ROOT)).toList();
        return Arrays.stream(Completion.values()).filter(script -> script.name().equalsIgnoreCase(shell)).findFirst()
                .orElseThrow(() -> Problem.usage("there is no completion script for '" + shell + "'", "--completion",
                        NearestName.of(shell, known).map(name -> "Did you mean " + name + "?").orElse("Known are "
                                + String.join(", ", known))).asException());
    }
}
