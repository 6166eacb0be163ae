package org.wintersill.run;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.engine.WinterStore;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Envelope;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.netcdf.write.CfWinterWriter;
import org.wintersill.io.netcdf.write.WinterFile;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.season.WinterValues;

/** The winter layers as CF NetCDF: {@code <cultivar>/winters.nc} with margin, damage and worst night, and {@code shared/winters.nc}. */
final class NetcdfOutput {
    private static final int ROWS_AT_ONCE = 256;

    private final RunPlan plan;
    private final WinterStore store;
    private final OutputFolder folder;
    private final CoordinateOperations operations;
    private final String period;

    NetcdfOutput(RunPlan plan, WinterStore store, OutputFolder folder, CoordinateOperations operations, String period) {
        this.plan = plan;
        this.store = store;
        this.folder = folder;
        this.operations = operations;
        this.period = period;
    }

    void write() {
        int levels = plan.job().levels();
        write("shared/winters.nc", Optional.empty(), List.of(WinterLayers.MINIMUM), List.of(WinterValues.minimumPlane()));
        for (int c = 0; c < plan.cultivars().size(); c++) {
            Cultivar cultivar = plan.cultivars().get(c);
            write(cultivar.id() + "/winters.nc", Optional.of(cultivar),
                    List.of(WinterLayers.MARGIN, WinterLayers.DAMAGE, WinterLayers.WORST_NIGHT),
                    List.of(WinterValues.marginPlane(c, 0, levels), WinterValues.damagePlane(c, levels),
                            WinterValues.worstNightPlane(c, levels)));
        }
    }

    private void write(String name, Optional<Cultivar> cultivar, List<LayerDefinition> layers, List<Integer> planes) {
        Path path = folder.unfinished(name);
        WinterFile file = new WinterFile(plan.target(), globe(), plan.seasons(), layers,
                CrsDefinitions.gridMapping(plan.target().crs()), attributes(cultivar));
        try (CfWinterWriter writer = CfWinterWriter.create(path, file)) {
            for (int layer = 0; layer < layers.size(); layer++) {
                for (int winter = 0; winter < plan.seasons().size(); winter++) {
                    for (int row = 0; row < plan.target().rows(); row += ROWS_AT_ONCE) {
                        int rows = Math.min(ROWS_AT_ONCE, plan.target().rows() - row);
                        writer.write(layer, winter, row, rows, store.read(planes.get(layer), winter, row, rows));
                    }
                }
            }
            writer.finish();
        }
    }

    private Map<String, String> attributes(Optional<Cultivar> cultivar) {
        String who = cultivar.map(known -> known.name() + " (" + known.species() + ", " + known.organ() + "; curve "
                + known.status().word() + ", " + known.source() + ")").orElse("no cultivar");
        Map<String, String> attributes = new LinkedHashMap<>();
        String title = plan.config().title().isEmpty() ? "Winter layers" : plan.config().title();
        attributes.put("title", title + ", winters " + period);
        attributes.put("summary", "Values of every winter from daily minimum temperatures: " + who + ". " + Caution.SHORT);
        attributes.put("keywords", "cold hardiness, minimum temperature, winter damage");
        attributes.put("id", "wintersill-" + cultivar.map(Cultivar::id).orElse("shared"));
        attributes.put("naming_authority", "org.wintersill");
        attributes.put("history", RunVersion.program() + " map");
        attributes.put("source", RunVersion.program() + ", daily minimum temperatures of " + plan.source().files().size() + " files");
        attributes.put("institution", "not stated");
        attributes.put("license", "as the inputs");
        attributes.put("creator_name", "not stated");
        attributes.put("date_created", PeriodEnd.of(plan.seasons()).toString());
        return attributes;
    }

    /** The target's area in degrees, from points along its border. */
    private Envelope globe() {
        GridGeometry grid = plan.target();
        if (grid.crs().sameAs(operations.wgs84())) {
            return grid.envelope();
        }
        CoordinateOperation toDegrees = operations.between(grid.crs(), operations.wgs84());
        double west = 180;
        double south = 90;
        double east = -180;
        double north = -90;
        int steps = 50;
        double[] xy = new double[2];
        for (int i = 0; i <= steps; i++) {
            for (int j = 0; j <= steps; j += i == 0 || i == steps ? 1 : steps) {
                xy[0] = grid.west() + (grid.east() - grid.west()) * i / steps;
                xy[1] = grid.south() + (grid.north() - grid.south()) * j / steps;
                toDegrees.transform(xy, 1);
                west = Math.min(west, xy[0]);
                east = Math.max(east, xy[0]);
                south = Math.min(south, xy[1]);
                north = Math.max(north, xy[1]);
            }
        }
        return new Envelope(west, south, east, north);
    }
}
