package org.wintersill.config;

import java.nio.file.Path;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.io.yaml.YamlText;

/**
 * Everything a run is asked to be, checked, with defaults filled in.
 *
 * @param runFile the run file; null for a run from flags alone
 * @param baseFolder the folder that paths of the run file are relative to; the empty path for the current folder
 * @param title a few words for outputs
 * @param temperature daily temperatures
 * @param elevation adjustment to a terrain model; empty: the outputs stay on the grid of the temperatures
 * @param winter what a winter is
 * @param missingDays rule for missing days: {@code month-10-5}, {@code month-5-3} or {@code none}
 * @param cultivars cultivar files and the ones to use
 * @param damage how damage is counted
 * @param statistics statistics over winters
 * @param classes limits of killing-winter frequency, three, ascending
 * @param area part of the target grid
 * @param scenario a climate model's future in place of the minima
 * @param parcels polygons to describe at the end
 * @param outputs what is written
 * @param limits how much of the machine may be used
 * @param effective the whole configuration as a tree of maps, lists, texts, numbers and truth values in the order and the words
 *                  of the run file, defaults filled in, paths as given
 */
public record RunConfig(Path runFile, Path baseFolder, String title, TemperatureConfig temperature,
                        Optional<ElevationConfig> elevation, WinterConfig winter, String missingDays,
                        CultivarConfig cultivars, DamageConfig damage, StatisticsConfig statistics, List<Double> classes,
                        Optional<AreaConfig> area, Optional<ScenarioConfig> scenario, Optional<ParcelsConfig> parcels, OutputConfig outputs,
                        LimitConfig limits, Map<String, Object> effective) {
    public RunConfig {
        classes = List.copyOf(classes);
        effective = Collections.unmodifiableMap(new LinkedHashMap<>(effective));
    }

    /**
     * The configuration of flags alone; paths are relative to the current folder.
     *
     * @throws org.wintersill.problem.ProblemException with all problems
     */
    public static RunConfig ofFlags(List<Setting> flags) {
        return ConfigReader.read(Optional.empty(), flags);
    }

    /** A run file that says the same: read from {@link #baseFolder()} it gives this configuration again. */
    public String toYaml() {
        return YamlText.of(effective);
    }
}
