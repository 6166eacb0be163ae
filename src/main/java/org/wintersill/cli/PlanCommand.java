package org.wintersill.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wintersill.config.RunConfig;
import org.wintersill.config.RunFileText;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code plan}: everything that map would check and decide. */
@Command(name = "plan", header = "Check a run and show what it would do; write nothing.",
        description = {"Shows grids, winters found and dropped, missing days, and what the run will take in memory, disk and time. "
                + "Ends as map would end if it refused the run.", "", "RUN.yaml may also be a folder: its files are opened, and what they are "
                + "good for - daily minima, terrain model, source heights, cultivars - is told and planned with."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill plan sample-grids/run.yaml",
            "  wintersill plan --minimum 'sample-grids/tmin-*.nc' --cultivars sample-grids/cultivars.yaml \\",
            "      --write run.yaml",
            "  wintersill plan sample-grids --write run.yaml"})
final class PlanCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Mixin
    private RunArguments run;

    @Option(names = "--write", paramLabel = "RUN.yaml", description = "If the plan is good, write it as a commented run file to "
            + "start from. An existing file is never replaced.")
    private String write;

    @Option(names = "--json", description = "Tell the plan as one JSON document on standard output.")
    private boolean json;

    @Mixin
    private Manners manners;

    PlanCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> {
            RunConfig config = run.isFolder() ? run.config(session.commands().settings(run.folder(), console)) : run.config();
            Path target = write == null ? null : RunArguments.path(write);
            if (target != null) {
                RunFileText.checkNew(target);
            }
            int code = session.commands().plan(config, new PlanOptions(json), console);
            if (code == ExitCode.DONE && target != null) {
                RunFileText.write(config, target);
                console.message("The run file is " + target);
            }
            return code;
        });
    }
}
