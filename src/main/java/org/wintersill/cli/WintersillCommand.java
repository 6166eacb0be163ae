package org.wintersill.cli;

import org.wintersill.problem.Problem;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** The program itself; its work is done by its commands. */
@Command(name = "wintersill", header = "Winter cold damage and hardiness margins of woody perennials, cell by cell.",
        description = {"Reads gridded daily minimum temperatures, adjusts them to a terrain model, applies the cold hardiness of "
                + "cultivars and writes layers of damage probability and margin.", "",
            "A screening at the grid's scale: no substitute for loggers on the site, local rules, or advice from a licensed "
                + "practitioner."},
        footerHeading = "%nExample:%n", footer = {"  wintersill map sample-grids/run.yaml",
            "", "wintersill COMMAND --help tells more about a command."})
final class WintersillCommand implements Runnable, Manners.Kept {

    @Option(names = "--version", versionHelp = true, description = "Show the version and stop.")
    private boolean version;

    @Mixin
    private Manners manners;

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public void run() {
        throw Problem.usage("no command is given", "", "Choose map, plan, inspect, explain, parcels or curves; --help tells more").asException();
    }
}
