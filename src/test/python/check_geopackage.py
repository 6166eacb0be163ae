"""check_geopackage.py SAMPLE.gpkg PARTS.gpkg CODES COLUMNS

Checks files written by GeoPackageOutsideTest with GDAL:
- SAMPLE.gpkg with GDAL's conformance checker (--extra) and ogrinfo, which must have nothing to say;
- editing SAMPLE.gpkg keeps its spatial index right, which the triggers do;
- the parts in PARTS.gpkg (table parts, columns class_code and part) against gdal.Polygonize of the same raster:
  CODES holds one byte a cell, row by row from the north, 0 for none; cells are 100 wide and 50 high, the
  north-western corner is (4321000, 3210000).
Exit 0 when all agree.
"""
import shutil
import subprocess
import sys

import numpy as np
from osgeo import gdal, ogr, osr
from osgeo_utils.samples import validate_gpkg

gdal.UseExceptions()
ogr.UseExceptions()
osr.UseExceptions()
sample, parts, codes, columns = sys.argv[1:5]

for path in (sample, parts):
    checker = validate_gpkg.GPKGChecker(path, abort_at_first_error=False, extra_checks=True, log_msg=False,
                                        warning_msg=False)
    checker.check()
    assert not checker.errors, checker.errors
    said = subprocess.run(["ogrinfo", "-ro", "-so", "-al", path], capture_output=True, text=True)
    assert said.returncode == 0 and not said.stderr, said.stderr

file = ogr.Open(sample)
layer = file.GetLayerByName("suitability")
assert layer.GetMetadataItem("IDENTIFIER") == "Suitability"
described = gdal.OpenEx(sample)  # kept: a domain lives no longer than its file
domain = described.GetFieldDomain("suitability_class")
assert sorted(domain.GetEnumeration()) == ["marginal", "secure", "unfit", "workable"]
assert layer.GetSpatialRef().GetAuthorityCode(None) == "3035"
assert layer.GetFeature(1)["cultivar_name"] == "Riesling & Co <1>"
assert layer.GetFeature(4)["elevation_min"] is None

domain = described = layer = file = None
edited = sample + ".edited.gpkg"
shutil.copy(sample, edited)
file = ogr.Open(edited, 1)
layer = file.GetLayerByName("suitability")
feature = layer.GetFeature(2)
feature.SetGeometry(ogr.CreateGeometryFromWkt("MULTIPOLYGON (((0 0, 10 0, 10 10, 0 0)))"))
layer.SetFeature(feature)
layer.DeleteFeature(1)
feature = layer = file = None  # closes the file
file = ogr.Open(edited)
boxes = file.ExecuteSQL("SELECT id, maxx FROM rtree_suitability_geom ORDER BY id")
found = [(f["id"], f["maxx"]) for f in boxes]
file.ReleaseResultSet(boxes)
assert [f[0] for f in found] == [2, 3, 4] and found[0][1] == 10, found

columns = int(columns)
raster = np.fromfile(codes, "u1").reshape(-1, columns)
source = gdal.GetDriverByName("MEM").Create("", columns, raster.shape[0], 1, gdal.GDT_Byte)
source.SetGeoTransform((4321000, 100, 0, 3210000, 0, -50))
source.GetRasterBand(1).WriteArray(raster)
memory = ogr.GetDriverByName("Memory").CreateDataSource("")
theirs = memory.CreateLayer("theirs")
theirs.CreateField(ogr.FieldDefn("code", ogr.OFTInteger))
gdal.Polygonize(source.GetRasterBand(1), None, theirs, 0)


def outlines(layer, name):
    rows = []
    for feature in layer:
        geometry = feature.GetGeometryRef()
        if geometry.GetGeometryName() == "MULTIPOLYGON":
            geometry = geometry.GetGeometryRef(0)
        if feature[name]:
            rows.append((feature[name], geometry.GetEnvelope(), geometry.GetArea()))
    return sorted(rows)


file = ogr.Open(parts)
ours = outlines(file.GetLayerByName("parts"), "class_code")
expected = outlines(theirs, "code")
assert len(ours) == len(expected), (len(ours), len(expected))
assert ours == expected, [pair for pair in zip(ours, expected) if pair[0] != pair[1]][:3]
