#!/usr/bin/env python3
"""make_vector_fixtures.py [FOLDER]

Writes the polygon files that VectorReadingTest reads, with GDAL (OGR), so that the readers are held to another maker's files.
Everything in them is invented. The numbers that the test expects stand in the test.
"""
import os
import sqlite3
import struct
import sys

from osgeo import ogr, osr

ogr.UseExceptions()
out = sys.argv[1] if len(sys.argv) > 1 else "src/test/resources/vector"
os.makedirs(out, exist_ok=True)

SQUARE = "POLYGON ((0 0,4 0,4 2,0 2,0 0))"
WITH_HOLE = "POLYGON ((10 0,20 0,20 10,10 10,10 0),(12 2,12 8,18 8,18 2,12 2))"
MULTI = "MULTIPOLYGON (((30 0,31 0,31 1,30 1,30 0)),((40 0,42 0,42 2,40 2,40 0)))"
BOW_TIE = "POLYGON ((50 0,54 4,54 0,50 4,50 0))"
FLAT = "POLYGON ((60 0,64 0,62 0,60 0))"


def system(code):
    made = osr.SpatialReference()
    made.ImportFromEPSG(code)
    made.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
    return made


def write(driver, name, code, kind, rows, layer="plots", options=(), layer_options=(), update=False):
    path = os.path.join(out, name)
    d = ogr.GetDriverByName(driver)
    if not update and os.path.exists(path):
        d.DeleteDataSource(path)
    source = ogr.Open(path, 1) if update else d.CreateDataSource(path, options=list(options))
    made = source.CreateLayer(layer, system(code) if code else None, kind, options=list(layer_options))
    made.CreateField(ogr.FieldDefn("parcel_id", ogr.OFTString))
    made.CreateField(ogr.FieldDefn("name", ogr.OFTString))
    made.CreateField(ogr.FieldDefn("rank", ogr.OFTReal))
    for i, (wkt, key, name) in enumerate(rows):
        feature = ogr.Feature(made.GetLayerDefn())
        feature.SetField("parcel_id", key)
        feature.SetField("name", name)
        feature.SetField("rank", i + 0.5)
        if wkt is not None:
            feature.SetGeometry(ogr.CreateGeometryFromWkt(wkt))
        made.CreateFeature(feature)
    source = None
    return path


ROWS = [(SQUARE, "a", "Square"), (WITH_HOLE, "b", "With a hole"), (MULTI, "c", "Two parts"), (None, "d", "Nothing"),
        ("POLYGON EMPTY", "e", "Empty"), (BOW_TIE, "f", "Bow tie"), (FLAT, "g", "Flat")]
HOSTILE = [(SQUARE, "1; DROP TABLE plots; --", "<script>alert(1)</script>"), (MULTI, "=1+2", "../../etc/passwd")]

plain = write("GPKG", "plain.gpkg", 3857, ogr.wkbUnknown, ROWS)
write("GPKG", "plain.gpkg", 4326, ogr.wkbPoint, [("POINT (1 2)", "p", "Point")], layer="springs", update=True)
heights = [("POLYGON Z ((0 0 5,4 0 5,4 2 6,0 2 5,0 0 5))", "z", "Z"), ("POLYGON M ((0 0 5,4 0 5,4 2 6,0 2 5,0 0 5))", "m", "M"),
           ("MULTIPOLYGON ZM (((0 0 5 1,4 0 5 1,4 2 6 1,0 2 5 1,0 0 5 1)))", "zm", "Z and M")]
write("GPKG", "heights.gpkg", 2056, ogr.wkbUnknown, heights)
write("GPKG", "two-layers.gpkg", 4326, ogr.wkbPolygon, ROWS[:1], layer="first_layer")
write("GPKG", "two-layers.gpkg", 4326, ogr.wkbMultiPolygon, [ROWS[2]], layer="order", update=True)
write("GPKG", "hostile.gpkg", 4326, ogr.wkbUnknown, HOSTILE, layer="select", layer_options=["GEOMETRY_NAME=from"])
write("GPKG", "curves.gpkg", 4326, ogr.wkbUnknown, [("CURVEPOLYGON (CIRCULARSTRING (0 0,1 1,2 0,1 -1,0 0))", "k", "Curve")])

viewed = write("GPKG", "view.gpkg", 4326, ogr.wkbPolygon, ROWS[:1], layer="plots")
with sqlite3.connect(viewed) as db:
    db.execute("PRAGMA journal_mode=DELETE")
    for trigger, in db.execute("SELECT name FROM sqlite_master WHERE type='trigger'").fetchall():
        db.execute('DROP TRIGGER "%s"' % trigger)
    db.execute("ALTER TABLE plots RENAME TO hidden")
    db.execute("CREATE VIEW plots AS WITH RECURSIVE endless(n) AS (SELECT 1 UNION ALL SELECT n + 1 FROM endless) "
               "SELECT n AS fid, geom, parcel_id, name FROM endless, hidden")

write("GeoJSON", "plain.geojson", 4326, ogr.wkbUnknown, ROWS[:4], layer_options=["RFC7946=YES"])
write("GeoJSON", "older.geojson", 3857, ogr.wkbUnknown, ROWS[:1])
write("ESRI Shapefile", "plain.shp", 25832, ogr.wkbPolygon,
      [(SQUARE, "a", "Gr\u00fcnwiese"), (WITH_HOLE, "b", "With a hole"), (MULTI, "c", "Two parts"), (None, "d", "Nothing")],
      layer="plain", layer_options=["ENCODING=UTF-8"])
write("ESRI Shapefile", "latin.shp", 3857, ogr.wkbPolygon25D,
      [("POLYGON Z ((0 0 5,4 0 5,4 2 6,0 2 5,0 0 5))", "z", "\u00c5se")], layer="latin", layer_options=["ENCODING=ISO-8859-1"])
os.remove(os.path.join(out, "latin.cpg"))
with open(os.path.join(out, "latin.dbf"), "r+b") as table:
    table.seek(29)
    table.write(struct.pack("B", 0))
os.rename(os.path.join(out, "latin.dbf"), os.path.join(out, "LATIN.DBF"))
print("written to", out)
