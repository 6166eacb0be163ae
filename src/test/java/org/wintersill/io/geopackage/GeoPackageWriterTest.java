package org.wintersill.io.geopackage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.TimeZone;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.io.WKBReader;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

class GeoPackageWriterTest {

    @TempDir
    Path folder;

    @Test
    void theHeaderSaysGeoPackageOneThreeWithRollbackJournal() throws Exception {
        Path file = SampleGeoPackage.write(folder.resolve("a.gpkg"));
        ByteBuffer header = ByteBuffer.wrap(Files.readAllBytes(file));
        assertEquals("SQLite format 3\0", new String(header.array(), 0, 16, "US-ASCII"));
        assertEquals(4096, header.getShort(16));
        assertArrayEquals(new byte[] {1, 1}, Arrays.copyOfRange(header.array(), 18, 20));
        assertEquals(10300, header.getInt(60));
        assertEquals("GPKG", new String(header.array(), 68, 4, "US-ASCII"));
        try (var files = Files.list(folder)) {
            assertEquals(List.of(file), files.toList());
        }
    }

    @Test
    void theSameCallsGiveTheSameBytesInAnyLocaleAndZone() throws Exception {
        Path first = SampleGeoPackage.write(folder.resolve("first.gpkg"));
        Locale locale = Locale.getDefault();
        TimeZone zone = TimeZone.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
            TimeZone.setDefault(TimeZone.getTimeZone("Asia/Kathmandu"));
            Thread.sleep(20);
            assertEquals(-1, Files.mismatch(first, SampleGeoPackage.write(folder.resolve("second.gpkg"))));
        } finally {
            Locale.setDefault(locale);
            TimeZone.setDefault(zone);
        }
    }

    @Test
    void contentsCarryTitleExtentAndTheGivenTime() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")))) {
            assertEquals(List.of("ok"), in.column("PRAGMA integrity_check"));
            assertEquals(List.of(), in.column("PRAGMA foreign_key_check"));
            assertEquals(List.of("suitability", "layer_styles", "cells", "parcel_cultivars"),
                    in.column("SELECT table_name FROM gpkg_contents ORDER BY rowid"));
            assertEquals(List.of(SampleGeoPackage.LAST_CHANGE), in.column("SELECT DISTINCT last_change FROM gpkg_contents"));
            assertEquals(List.of("4321000.0 3209250.0 4322000.0 3210000.0"), in.column(
                    "SELECT min_x || ' ' || min_y || ' ' || max_x || ' ' || max_y FROM gpkg_contents "
                            + "WHERE table_name = 'suitability'"));
        }
    }

    @Test
    void everyGeometryIsIndexedAndItsHeaderHoldsItsEnvelope() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")));
                ResultSet rows = in.query("SELECT s.geom, r.minx, r.maxx, r.miny, r.maxy FROM suitability s "
                        + "JOIN rtree_suitability_geom r ON r.id = s.fid")) {
            int count = 0;
            while (rows.next()) {
                byte[] blob = rows.getBytes(1);
                ByteBuffer data = ByteBuffer.wrap(blob).order(java.nio.ByteOrder.LITTLE_ENDIAN);
                assertEquals("GP", new String(blob, 0, 2, "US-ASCII"));
                assertEquals(0b011, blob[3]);
                assertEquals(3035, data.getInt(4));
                Geometry geometry = new WKBReader().read(Arrays.copyOfRange(blob, 40, blob.length));
                var box = geometry.getEnvelopeInternal();
                assertEquals(box.getMinX(), data.getDouble(8));
                assertEquals(box.getMaxX(), data.getDouble(16));
                assertEquals(box.getMinY(), data.getDouble(24));
                assertEquals(box.getMaxY(), data.getDouble(32));
                assertTrue(rows.getDouble(2) <= box.getMinX() && rows.getDouble(3) >= box.getMaxX()
                        && rows.getDouble(4) <= box.getMinY() && rows.getDouble(5) >= box.getMaxY());
                assertTrue(geometry.isValid());
                count++;
            }
            assertEquals(4, count);
        }
    }

    @Test
    void triggersAreThoseOfVersionOneThree() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")))) {
            assertEquals(List.of("delete", "insert", "update1", "update2", "update3", "update4"), in.column(
                    "SELECT substr(name, 24) FROM sqlite_master WHERE type = 'trigger' AND tbl_name = 'suitability' "
                            + "ORDER BY name"));
        }
    }

    @Test
    void columnsCarryTitleUnitAndLegalValues() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")))) {
            assertEquals(List.of("Area (km2)|Area (km2)|area on the ellipsoid; unit km2"), in.column(
                    "SELECT name || '|' || title || '|' || description FROM gpkg_data_columns "
                            + "WHERE table_name = 'suitability' AND column_name = 'area_km2'"));
            assertEquals(List.of("secure", "workable", "marginal", "unfit"), in.column(
                    "SELECT value FROM gpkg_data_column_constraints WHERE constraint_name = 'suitability_class' "
                            + "ORDER BY rowid"));
            assertEquals(List.of("0 1 1 1"), in.column("SELECT min || ' ' || min_is_inclusive || ' ' || max || ' ' || "
                    + "max_is_inclusive FROM gpkg_data_column_constraints WHERE constraint_name = 'fraction'"));
        }
    }

    @Test
    void missingValuesAreNull() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")));
                ResultSet rows = in.query("SELECT elevation_min, elevation_mean, elevation_max, class FROM suitability "
                        + "WHERE class_code = 4")) {
            assertTrue(rows.next());
            assertNull(rows.getObject(1));
            assertNull(rows.getObject(2));
            assertNull(rows.getObject(3));
            assertEquals("unfit", rows.getString(4));
        }
    }

    @Test
    void cellsWithoutAnyValueAreLeftOutAndFloatsStayReadable() throws Exception {
        try (Reading in = new Reading(SampleGeoPackage.write(folder.resolve("a.gpkg")))) {
            assertEquals(List.of("11"), in.column("SELECT count(*) FROM cells"));
            assertEquals(List.of("0.3"), in.column("SELECT damage_mean FROM cells WHERE grid_row = 0 AND grid_column = 1"));
            assertEquals(List.of("1"), in.column("SELECT count(*) FROM cells WHERE margin_worst IS NULL"));
        }
    }

    @Test
    void namesFromOutsideAreDataNotStatements() throws Exception {
        String hostile = "Robert'); DROP TABLE suitability;-- \u00e9\ud83c\udf47 \"";
        Path file = folder.resolve("odd ?mode=memory&x=1 %3f#'.gpkg");
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            FeatureTable table = writer.features(TableDefinition.attributes("parcels", hostile, hostile,
                    List.of(Column.text("name", hostile, hostile))));
            table.addAttributes(hostile);
            writer.metadata("https://www.w3.org/ns/prov", "{}");
            writer.finish();
        }
        assertTrue(Files.size(file) > 0);
        Path plain = Files.copy(file, folder.resolve("plain.gpkg"));
        try (Reading in = new Reading(plain)) {
            assertEquals(List.of(hostile), in.column("SELECT name FROM parcels"));
            assertEquals(List.of(hostile), in.column("SELECT identifier FROM gpkg_contents"));
        }
    }

    @Test
    void closingBeforeTheEndLeavesNothing() throws Exception {
        Path file = folder.resolve("gone.gpkg");
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            writer.features(TableDefinition.attributes("t", "t", "t", List.of(Column.text("a", "a", "a"))))
                    .addAttributes("x");
        }
        try (var files = Files.list(folder)) {
            assertEquals(List.of(), files.toList());
        }
    }

    @Test
    void aRemnantUnderTheNameIsReplaced() throws Exception {
        Path file = folder.resolve("a.gpkg");
        Files.writeString(file, "half a file of an earlier run");
        SampleGeoPackage.write(file);
        try (Reading in = new Reading(file)) {
            assertEquals(List.of("4"), in.column("SELECT count(*) FROM suitability"));
        }
    }

    @Test
    void aFolderThatIsNotThereIsOneProblem() {
        ProblemException thrown = assertThrows(ProblemException.class, () -> GeoPackageWriter.create(
                folder.resolve("none").resolve("a.gpkg"), SampleGeoPackage.LAST_CHANGE));
        assertEquals(Problem.Kind.OUTPUT, thrown.problems().get(0).kind());
        assertTrue(thrown.problems().get(0).where().endsWith("a.gpkg"));
    }

    @Test
    void mistakesOfTheProgramAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Column.text("Name; DROP", "", ""));
        assertThrows(IllegalArgumentException.class, () -> Column.text("a".repeat(31), "", ""));
        assertThrows(IllegalArgumentException.class, () -> TableDefinition.attributes("t", "t", "t",
                List.of(Column.text("a", "", ""), Column.text("a", "", ""))));
        assertThrows(IllegalArgumentException.class, () -> GeoPackageWriter.create(folder.resolve("a"), "yesterday"));
        try (GeoPackageWriter writer = GeoPackageWriter.create(folder.resolve("a.gpkg"), SampleGeoPackage.LAST_CHANGE)) {
            assertThrows(IllegalArgumentException.class, () -> writer.features(
                    new TableDefinition("t", "t", "t", "POINT", 3035, List.of())));
            FeatureTable points = writer.features(new TableDefinition("p", "p", "p", "POINT", 4326, List.of()));
            assertThrows(IllegalArgumentException.class, () -> points.addPoint(Double.NaN, 1));
            assertThrows(IllegalArgumentException.class, () -> points.addPoint(1, 1, "one too many"));
            assertThrows(IllegalArgumentException.class, () -> points.add(new GeometryFactory().createPolygon()));
        }
    }

    @Test
    void emptyGeometriesSaySoAndStayOutOfTheIndex() throws Exception {
        Path file = folder.resolve("a.gpkg");
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            FeatureTable table = writer.features(new TableDefinition("p", "p", "p", "GEOMETRY", 4326, List.of()));
            table.add(new GeometryFactory().createMultiPolygon());
            table.add(null);
            table.add(new GeometryFactory().createPoint(new Coordinate(7, 46)));
            writer.finish();
        }
        try (Reading in = new Reading(file)) {
            assertEquals(List.of("3"), in.column("SELECT id FROM rtree_p_geom"));
            assertEquals(List.of("11"), in.column("SELECT hex(substr(geom, 4, 1)) FROM p WHERE fid = 1"));
            assertEquals(List.of("01"), in.column("SELECT hex(substr(geom, 4, 1)) FROM p WHERE fid = 3"));
            assertEquals(List.of("29"), in.column("SELECT length(geom) FROM p WHERE fid = 3"));
        }
    }

    @Test
    void aSystemWithoutCodeGetsANumberOfItsOwn() throws Exception {
        CrsRow own = CrsRow.of(new org.wintersill.grid.Crs("", "Local", "LOCAL_CS[\"x\"]",
                org.wintersill.grid.Crs.Kind.PROJECTED, 1, null), "", CrsRow.FIRST_OWN_ID);
        assertEquals("NONE", own.organization());
        assertFalse(own.srsId() < 100_000);
        Path file = folder.resolve("a.gpkg");
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            assertEquals(100_000, writer.addCrs(own));
            assertEquals(100_000, writer.addCrs(own));
            assertEquals(4326, writer.addCrs(CrsRow.WGS84));
            writer.finish();
        }
        try (Reading in = new Reading(file)) {
            assertEquals(List.of("undefined"), in.column(
                    "SELECT definition_12_063 FROM gpkg_spatial_ref_sys WHERE srs_id = 100000"));
        }
    }

    @Test
    void columnsOfOneTitleKeepDifferentNames() throws Exception {
        Path file = folder.resolve("a.gpkg");
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, SampleGeoPackage.LAST_CHANGE)) {
            writer.features(TableDefinition.attributes("t", "t", "t",
                    List.of(Column.text("a", "Same", "a"), Column.text("b", "Same", "b"))));
            writer.finish();
        }
        try (Reading in = new Reading(file)) {
            assertEquals(List.of("Same", "b"), in.column("SELECT name FROM gpkg_data_columns ORDER BY rowid"));
        }
    }

    /** A finished file, opened read-only. */
    private static final class Reading implements AutoCloseable {
        private final Connection connection;
        private final Statement statement;

        Reading(Path file) throws Exception {
            connection = DriverManager.getConnection("jdbc:sqlite:file:" + file.toUri().getRawPath() + "?mode=ro");
            statement = connection.createStatement();
        }

        ResultSet query(String sql) throws Exception {
            return statement.executeQuery(sql);
        }

        List<String> column(String sql) throws Exception {
            List<String> values = new ArrayList<>();
            try (ResultSet rows = query(sql)) {
                while (rows.next()) {
                    values.add(rows.getString(1));
                }
            }
            return values;
        }

        @Override
        public void close() throws Exception {
            statement.close();
            connection.close();
        }
    }
}
