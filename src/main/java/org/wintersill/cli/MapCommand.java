package org.wintersill.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wintersill.config.RunConfig;
import org.wintersill.config.ScenarioConfig;
import org.wintersill.config.Setting;
import org.wintersill.problem.Problem;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code map}: the main job. */
@Command(name = "map", header = "Make the layers: temperature grids in, damage and margin maps out.",
        description = {"Reads daily minimum temperatures, brings them to the heights of a terrain model, follows every cultivar "
                + "through every winter and writes GeoTIFF layers, a GeoPackage, tables and a record of what made them."},
        footerHeading = "%nExamples:%n",
        footer = {"  wintersill map sample-grids/run.yaml",
            "  wintersill map sample-grids/run.yaml --out out-steep --set elevation.lapse-rate=6.5",
            "  wintersill map sample-grids/run.yaml --winters-from out --set statistics.interval=0.8 --out out-80",
            "  wintersill map --minimum 'sample-grids/tmin-*.nc' --dem sample-grids/dem.tif \\",
            "      --cultivars sample-grids/cultivars.yaml --out out"})
final class MapCommand implements Callable<Integer>, Manners.Kept {
    private final Session session;

    @Mixin
    private RunArguments run;

    @Option(names = "--overwrite", description = "Replace an earlier result in the output folder.")
    private boolean overwrite;

    @Option(names = "--winters-from", paramLabel = "FOLDER", description = "Make tables, classes and statistics anew from the winters that a "
            + "finished run kept there (outputs.keep-winters: true), without going through the nights again.")
    private String wintersFrom;

    @Option(names = "--dry-run", description = "Check and decide everything, as plan does, and write nothing.")
    private boolean dryRun;

    @Option(names = "--print-config", description = "Print the whole configuration with defaults as a run file, and stop. Save it "
            + "beside the run file: its paths are relative to that folder.")
    private boolean printConfig;

    @Option(names = "--json", description = "Tell the result as one JSON document on standard output.")
    private boolean json;

    @Mixin
    private Manners manners;

    MapCommand(Session session) {
        this.session = session;
    }

    @Override
    public Manners manners() {
        return manners;
    }

    @Override
    public Integer call() {
        return session.call(manners, console -> {
            RunConfig config = run.config();
            if (config.scenario().filter(ScenarioConfig::hasOpenMembers).isPresent() && !printConfig && !dryRun) {
                if (wintersFrom != null) {
                    throw Problem.usage("winters can be taken for one member at a time", "--winters-from",
                            "Name the member: --set scenario.member=NAME").asException();
                }
                return members(config, console);
            }
            if (printConfig) {
                console.result(config.toYaml());
                return ExitCode.DONE;
            }
            if (dryRun) {
                return session.commands().plan(config, new PlanOptions(json), console);
            }
            return session.commands().map(config, new MapOptions(overwrite, json, Optional.ofNullable(wintersFrom)
                    .map(RunArguments::path)), console);
        });
    }

    /** One run for each member of the scenario, each in a folder of its own within the output folder. */
    private int members(RunConfig config, Console console) {
        List<RunConfig> runs = new ArrayList<>();
        for (String member : config.scenario().orElseThrow().members()) {
            runs.add(run.config(List.of(), List.of(Setting.text("--set", "scenario.member", member),
                    Setting.paths("--out", "outputs.folder", List.of(config.outputs().folder().resolve(member).toString())))));
        }
        runs.forEach(member -> session.commands().check(member, overwrite));
        for (RunConfig member : runs) {
            console.message("Member " + member.scenario().orElseThrow().member().orElseThrow());
            int code = session.commands().map(member, new MapOptions(overwrite, json, Optional.empty()), console);
            if (code != ExitCode.DONE) {
                return code;
            }
        }
        return ExitCode.DONE;
    }
}
