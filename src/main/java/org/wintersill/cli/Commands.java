package org.wintersill.cli;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.config.RunConfig;
import org.wintersill.config.Setting;

/** The work behind the commands. Each returns an exit code and throws problems as they are. */
public interface Commands {

    /** Grids in, layers out. */
    int map(RunConfig config, MapOptions options, Console console);

    /**
     * Refuses an output folder that {@link #map} would refuse.
     *
     * @param overwrite whether earlier outputs may be replaced
     */
    void check(RunConfig config, boolean overwrite);

    /** Everything that {@link #map} would check and decide; writes nothing. */
    int plan(RunConfig config, PlanOptions options, Console console);

    /** The settings of a run on whatever a folder of inputs holds; each file is told of. */
    List<Setting> settings(Path folder, Console console);

    /** What changed between finished outputs. */
    int compare(CompareOptions options, Console console);

    /** How input files are understood. */
    int inspect(InspectOptions options, Console console);

    /** One cell, night by night. */
    int explain(RunConfig config, ExplainOptions options, Console console);

    /** The minima of a run against those of stations. */
    int stations(RunConfig config, Path table, ExplainOptions.Format format, Console console);

    /** Cultivar files by themselves. */
    int curves(CurvesOptions options, Console console);

    /** Parcels or zones by the layers of a finished run. */
    int parcels(ParcelsOptions options, Console console);
}
