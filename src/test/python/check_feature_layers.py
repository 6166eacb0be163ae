#!/usr/bin/python3
"""Prints what is wrong with the feature layers of a GeoPackage; silent when nothing is.

  check_feature_layers.py FILE.gpkg

Geometries valid and of the declared type, contents extent true, spatial index complete, texts filled, one default style a layer, probabilities within 0..1, no -9999 and no NaN.
"""
import math
import re
import sqlite3
import sys
import urllib.parse

from osgeo import ogr

ogr.UseExceptions()


def main(path):
    db = sqlite3.connect("file:%s?mode=ro&immutable=1" % urllib.parse.quote(path), uri=True)
    rows = lambda text, *values: db.execute(text, values).fetchall()
    with open(path, "rb") as f:
        head = f.read(20)
    if head[18:20] != b"\1\1":
        print("G2 write-ahead journal")
    if rows("PRAGMA page_size") != [(4096,)]:
        print("G2 page size", rows("PRAGMA page_size"))
    ids = {r[0] for r in rows("SELECT srs_id FROM gpkg_spatial_ref_sys")}
    if not {-1, 0, 4326} <= ids:
        print("G4 CRS rows", sorted(ids))
    tables = rows("SELECT table_name, data_type, identifier, description, last_change, min_x, min_y, max_x, max_y FROM gpkg_contents")
    for table, kind, identifier, description, change, *extent in tables:
        if kind == "features" and not (identifier and description):
            print("G5 no identifier or description:", table)
        if not re.match(r"\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$", change or ""):
            print("G5 last_change", table, change)
    styles = rows("SELECT count(*) FROM sqlite_master WHERE name = 'layer_styles'")[0][0]
    data = ogr.Open(path)
    for k in range(data.GetLayerCount()):
        layer = data.GetLayer(k)
        name = layer.GetName()
        if layer.GetGeomType() == ogr.wkbNone:
            continue
        check_layer(layer, next(t[5:] for t in tables if t[0] == name))
        column = layer.GetGeometryColumn()
        count = rows('SELECT count(*) FROM "rtree_%s_%s"' % (name, column))[0][0]
        filled = sum(1 for f in iter_features(layer) if f.GetGeometryRef() is not None and not f.GetGeometryRef().IsEmpty())
        if count != filled:
            print("G10 %s: %d index entries for %d geometries" % (name, count, filled))
        if not styles or rows("SELECT count(*) FROM layer_styles WHERE f_table_name = ? AND useAsDefault = 1", name) != [(1,)]:
            print("G14 %s: not exactly one default style" % name)
        untold = {f.name for f in layer.schema} - {r[0] for r in rows("SELECT column_name FROM gpkg_data_columns WHERE table_name = ?", name)}
        if untold:
            print("G12 %s: columns without description: %s" % (name, sorted(untold)))


def iter_features(layer):
    layer.ResetReading()
    feature = layer.GetNextFeature()
    while feature is not None:
        yield feature
        feature = layer.GetNextFeature()


def check_layer(layer, extent):
    name, box = layer.GetName(), [math.inf, math.inf, -math.inf, -math.inf]
    declared = layer.GetGeomType()
    for field in layer.schema:
        if not re.match(r"[a-z][a-z0-9_]{0,29}$", field.name):
            print("G7 column name", name, field.name)
    for feature in iter_features(layer):
        shape = feature.GetGeometryRef()
        if shape is not None and not shape.IsEmpty():
            if shape.GetGeometryType() != declared:
                print("G9 %s row %d is %s" % (name, feature.GetFID(), shape.GetGeometryName()))
            if not shape.IsValid():
                print("G9 %s row %d is not valid" % (name, feature.GetFID()))
            x0, x1, y0, y1 = shape.GetEnvelope()
            box = [min(box[0], x0), min(box[1], y0), max(box[2], x1), max(box[3], y1)]
        for key, value in feature.items().items():
            if isinstance(value, float) and (math.isnan(value) or value == -9999):
                print("G15 %s row %d: %s is %s" % (name, feature.GetFID(), key, value))
            if isinstance(value, float) and ("probability" in key or key.endswith("share")) and not -1e-9 <= value <= 1 + 1e-9:
                print("%s row %d: %s is %s" % (name, feature.GetFID(), key, value))
    if box[0] < math.inf and any(v is None or abs(a - v) > 1e-6 * max(1, abs(a)) for a, v in zip(box, extent)):
        print("G5 %s: contents extent %s, geometries %s" % (name, extent, box))


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
