package org.wintersill.io.geotiff.read;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.SourceFile;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.time.DayAxis;

/** One GeoTIFF file of days. Keeps what it took from the header and no handle; chunk tables are read again by readers. */
final class GeotiffTemperatureSource implements DailyTemperatureSource {
    private final Path path;
    private final long size;
    private final CrsLookup systems;
    private final TemperatureRequest request;
    private final Georeference place;
    private final BandDates dates;
    private final Packing packing;
    private final StorageLayout layout;
    private final SourceFile description;

    GeotiffTemperatureSource(Path path, long size, CrsLookup systems, TemperatureRequest request, Georeference place, BandDates dates,
                             Packing packing, StorageLayout layout, SourceFile description) {
        this.path = path;
        this.size = size;
        this.systems = systems;
        this.request = request;
        this.place = place;
        this.dates = dates;
        this.packing = packing;
        this.layout = layout;
        this.description = description;
    }

    @Override
    public GridGeometry grid() {
        return place.grid();
    }

    @Override
    public DayAxis days() {
        return dates.axis();
    }

    @Override
    public ForcingVariable variable() {
        return request.forcing();
    }

    @Override
    public StorageLayout layout() {
        return layout;
    }

    @Override
    public List<SourceFile> files() {
        return List.of(description);
    }

    @Override
    public DailyTemperatureReader open() {
        TiffFile file = TiffFile.open(path);
        try {
            GeotiffHeader header = GeotiffHeader.read(file, systems, request.crs());
            if (file.size() != size || !header.place().equals(place) || header.image().samples() != dates.bands().length) {
                throw file.refuse("The file has changed since it was looked at", "Run again when nothing writes to it");
            }
            return new GeotiffTemperatureReader(file, header, dates.bands(), packing);
        } catch (RuntimeException e) {
            file.close();
            throw e;
        }
    }
}
