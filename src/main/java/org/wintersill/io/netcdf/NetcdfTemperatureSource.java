package org.wintersill.io.netcdf;

import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.SourceFile;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.temperature.TemperatureUnit;
import org.wintersill.time.DayAxis;

/** A daily record in one netCDF file. Immutable. */
final class NetcdfTemperatureSource implements DailyTemperatureSource {
    private final CdfHeader header;
    private final CdfVariable forcingVariable;
    private final Slabs.Order order;
    private final Packing packing;
    private final TemperatureUnit unit;
    private final GridPlacement placement;
    private final RecordDays days;
    private final StorageLayout layout;
    private final ForcingVariable forcing;
    private final SourceFile description;

    NetcdfTemperatureSource(CdfHeader header, CdfVariable variable, Slabs.Order order, Packing packing,
                            TemperatureUnit unit, GridPlacement placement, RecordDays days, StorageLayout layout, ForcingVariable forcing,
                            SourceFile description) {
        // coordinates were read; of the header only what readers need is kept
        this.header = new CdfHeader(header.path(), header.format(), header.fileSize(), java.util.Map.of());
        this.forcingVariable = variable;
        this.order = order;
        this.packing = packing;
        this.unit = unit;
        this.placement = placement;
        this.days = days;
        this.layout = layout;
        this.forcing = forcing;
        this.description = description;
    }

    @Override
    public GridGeometry grid() {
        return placement.grid();
    }

    @Override
    public DayAxis days() {
        return days.axis();
    }

    @Override
    public ForcingVariable variable() {
        return forcing;
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
        // made anew for each reader: its table would add up over thousands of files that are not open
        Unpacker unpacker = new Unpacker(packing, forcingVariable.littleEndian(), unit.factor(), unit.shift(),
                UnitChoice.COLDEST, UnitChoice.WARMEST);
        return new NetcdfTemperatureReader(header.path(), Slabs.open(header, forcingVariable, order, unpacker), placement,
                days.records());
    }
}
