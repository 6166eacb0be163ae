package org.wintersill.run.parcels;

import java.util.List;
import org.wintersill.grid.Crs;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.geopackage.CrsRow;
import org.wintersill.io.geopackage.FeatureTable;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.io.geopackage.TableDefinition;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.SldWriter;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.parcel.Outline;
import org.wintersill.run.parcels.ParcelFields.CultivarRow;
import org.wintersill.run.parcels.ParcelFields.WinterRow;

/**
 * The tables {@code parcels}, {@code parcel_cultivars} and {@code parcel_winters} of a GeoPackage. Outlines stay in the reference system of
 * the parcels' file.
 */
final class ParcelTables {
    private final GeoPackageWriter writer;
    private final FinishedRun run;
    private final List<TableField<ParcelResult>> parcelFields;
    private final List<TableField<CultivarRow>> cultivarFields;
    private final List<TableField<WinterRow>> winterFields;
    private final FeatureTable parcels;
    private final FeatureTable cultivars;
    private final FeatureTable winters;

    /** @param ownSystem number for a reference system without a code that no other one of the file has */
    ParcelTables(GeoPackageWriter writer, FinishedRun run, ParcelFields fields, Crs crs, int ownSystem) {
        this.writer = writer;
        this.run = run;
        parcelFields = fields.parcels();
        cultivarFields = fields.cultivars();
        winterFields = fields.winters();
        int srs = writer.addCrs(CrsRow.of(crs, CrsDefinitions.wkt2(crs), ownSystem));
        String period = run.winters().get(0) + (run.winters().size() > 1 ? " to " + run.winters().get(run.winters().size() - 1) : "");
        String caution = run.caution(run.cultivars());
        parcels = writer.features(new TableDefinition("parcels", "Parcels, winters " + period, run.title()
                + ". One row a parcel: best cultivars, heights, warnings. Values are means of the cells, weighted by covered area. " + caution,
                "MULTIPOLYGON", srs, TableField.columns(parcelFields)));
        cultivars = writer.features(new TableDefinition("parcel_cultivars", "Parcels and cultivars, winters " + period, run.title()
                + ". One row a parcel and cultivar, so filter by cultivar. " + caution, "MULTIPOLYGON", srs, TableField.columns(cultivarFields)));
        winters = writer.features(TableDefinition.attributes("parcel_winters", "Parcels, cultivars and winters", run.title()
                + ". One row a parcel, cultivar and winter that counts. " + caution, TableField.columns(winterFields)));
    }

    void add(ParcelResult parcel) {
        Outline outline = parcel.feature().outline();
        parcels.addOutline(outline, TableField.values(parcelFields, parcel));
        for (int c = 0; c < parcel.cultivars().size(); c++) {
            CultivarRow row = new CultivarRow(parcel, c, run.cultivars().get(c));
            cultivars.addOutline(outline, TableField.values(cultivarFields, row));
            for (int winter = 0; winter < run.winters().size(); winter++) {
                if (!Double.isNaN(row.result().damage()[winter])) {
                    winters.addAttributes(TableField.values(winterFields, new WinterRow(row, winter)));
                }
            }
        }
    }

    /** Stores the looks of the layers, after the last row. */
    void style() {
        style("parcels", "least_killing_probability", "Least frequency of killing winters of any cultivar");
        style("parcel_cultivars", "killing_probability", "Frequency of killing winters");
    }

    private void style(String table, String column, String title) {
        LayerStyle.Ramp ramp = LayerStyles.probability();
        writer.style(table, ramp.id(), QmlWriter.graduatedPolygons(ramp, column), SldWriter.graduatedPolygons(ramp, column), title);
    }
}
