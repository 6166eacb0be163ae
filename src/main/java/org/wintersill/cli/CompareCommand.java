package org.wintersill.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code compare}: what changed between finished outputs. */
@Command(name = "compare", header = "Compare finished outputs: change layers, shift of the range, members together.",
        description = {"Reads the output folders of map runs on one grid and writes, for each of the others against the base, the change of "
                + "margin, damage, killing winters and required hardiness, what of the range was kept, gained or lost, and where the change "
                + "is beyond chance; with several others also what they say together. Nothing is folded again."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill compare out out-future --out change",
            "  wintersill compare out out-future/alder out-future/birch --out change"})
final class CompareCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Parameters(index = "0", paramLabel = "BASE", description = "Finished output folder that the others are compared with.")
    private String base;

    @Parameters(index = "1..*", arity = "1..*", paramLabel = "OTHER", description = "Finished output folders of other periods or scenario "
            + "members.")
    private List<String> others = new ArrayList<>();

    @Option(names = "--out", paramLabel = "FOLDER", required = true, description = "Output folder.")
    private String out;

    @Option(names = "--cultivar", paramLabel = "ID", description = "Only this cultivar. May be given several times.")
    private List<String> cultivars = new ArrayList<>();

    @Option(names = "--overwrite", description = "Replace an earlier result in the output folder.")
    private boolean overwrite;

    @Option(names = "--threads", paramLabel = "N", description = "Threads to work with; results do not depend on it.")
    private int threads;

    @Option(names = "--json", description = "Tell the result as one JSON document on standard output.")
    private boolean json;

    @Mixin
    private Manners manners;

    CompareCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> session.commands().compare(new CompareOptions(RunArguments.path(base),
                others.stream().map(RunArguments::path).toList(), cultivars, RunArguments.path(out), overwrite, threads, json), console));
    }
}
