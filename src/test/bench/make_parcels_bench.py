#!/usr/bin/python3
"""make_parcels_bench.py FOLDER [CELLS PARCELS CULTIVARS WINTERS]

Makes what `wintersill parcels` reads, without a fold: a finished folder of invented layers of CELLS x CELLS cells, and a GeoPackage of
PARCELS star-shaped parcels of 100 vertices spread over it. Default 4000 10000 5 30. Layers are smooth fields with noise of a hundredth, so
that they compress as real ones do; cultivars and layers of one kind share one file on disk by hard links, which saves room and not work.
"""
import json
import os
import sys

import numpy as np
from osgeo import gdal, ogr, osr

gdal.UseExceptions()
ogr.UseExceptions()
folder = sys.argv[1]
cells, parcels, cultivars, winters = (int(a) for a in (sys.argv[2:6] if len(sys.argv) > 5 else (4000, 10000, 5, 30)))
STEP, WEST, NORTH = 250.0, 4_000_000.0, 3_200_000.0
rng = np.random.default_rng(20261201)
crs = osr.SpatialReference()
crs.ImportFromEPSG(3035)
crs.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
SUMMARIES = ["margin-mean", "margin-low", "margin-worst", "damage-mean", "damage-probability-10", "damage-probability-10-lower",
             "damage-probability-10-upper", "damage-probability-50", "damage-probability-50-lower", "damage-probability-50-upper",
             "damage-probability-90", "damage-probability-90-lower", "damage-probability-90-upper", "required-hardiness"]
names = []


def smooth():
    y, x = np.mgrid[0:cells, 0:cells] / cells
    return (3 * np.sin(7 * x + rng.random()) * np.cos(5 * y + rng.random()) + 2 * np.sin(40 * x * y)).astype(np.float32)


def write(name, kind, bands, maker, description):
    path = os.path.join(folder, name)
    os.makedirs(os.path.dirname(path), exist_ok=True)
    options = ["TILED=YES", "BLOCKXSIZE=256", "BLOCKYSIZE=256", "COMPRESS=DEFLATE", "INTERLEAVE=BAND", "BIGTIFF=IF_SAFER", "NUM_THREADS=2",
               "PREDICTOR=" + ("3" if kind == gdal.GDT_Float32 else "2" if kind == gdal.GDT_Int16 else "1")]
    made = gdal.GetDriverByName("GTiff").Create(path, cells, cells, bands, kind, options)
    made.SetGeoTransform((WEST, STEP, 0, NORTH, 0, -STEP))
    made.SetSpatialRef(crs)
    made.SetMetadataItem("TIFFTAG_IMAGEDESCRIPTION", description)
    for b in range(bands):
        band = made.GetRasterBand(b + 1)
        band.SetNoDataValue(0 if kind == gdal.GDT_Byte else -9999)
        band.SetUnitType("K")
        band.WriteArray(maker(b))
    made = None


def link(source, name):
    path = os.path.join(folder, name)
    os.makedirs(os.path.dirname(path), exist_ok=True)
    if os.path.join(folder, source) != path:
        os.link(os.path.join(folder, source), path)
    names.append(name)


base = smooth()
noise = rng.normal(0, 0.01, (cells, cells)).astype(np.float32)
write("c1/winters/margin.tif", gdal.GDT_Float32, winters, lambda b: base + np.float32(3 * np.sin(b)) + np.roll(noise, b, 1), "Margin: invented")
write("c1/winters/damage.tif", gdal.GDT_Float32, winters,
      lambda b: (1 / (1 + np.exp(base + np.float32(3 * np.sin(b)) + np.roll(noise, b, 1)))).astype(np.float32), "Damage: invented")
write("c1/winters/worst-night.tif", gdal.GDT_Int16, winters, lambda b: (120 + 5 * base + 3 * b).astype(np.int16), "Worst night: invented")
write("c1/margin-mean.tif", gdal.GDT_Float32, 1, lambda b: base + noise, "Mean margin: invented")
write("c1/suitability.tif", gdal.GDT_Byte, 1, lambda b: np.clip(2.5 - base, 1, 4).astype(np.uint8), "Suitability: invented")
sidecar = ("<PAMDataset><PAMRasterBand band=\"1\"><CategoryNames><Category/><Category>secure</Category><Category>workable</Category>"
           "<Category>marginal</Category><Category>unfit</Category></CategoryNames></PAMRasterBand></PAMDataset>")
for c in range(1, cultivars + 1):
    for layer in ("margin", "damage", "worst-night"):
        link("c1/winters/%s.tif" % layer, "c%d/winters/%s.tif" % (c, layer))
    for layer in SUMMARIES:
        link("c1/margin-mean.tif", "c%d/%s.tif" % (c, layer))
    link("c1/suitability.tif", "c%d/suitability.tif" % c)
    with open(os.path.join(folder, "c%d/suitability.tif.aux.xml" % c), "w") as f:
        f.write(sidecar)
for layer in ("elevation", "mean-minimum", "valid-winters"):
    link("c1/margin-mean.tif", "shared/%s.tif" % layer)
record = {"version": 1, "title": "Bench, invented", "calendar": "standard", "winters": ["%d-%02d" % (1990 + w, (91 + w) % 100) for w in range(winters)],
          "winter-starts": ["%d-09-01" % (1990 + w) for w in range(winters)],
          "configuration": {"damage": {"killing": 50}, "statistics": {"interval": 0.9, "bounds": "jeffreys", "target": 0.1}},
          "cultivars": [{"id": "c%d" % c, "name": "Cultivar %d (invented)" % c, "species": "none", "organ": "bud", "status": "invented",
                         "source": "made up"} for c in range(1, cultivars + 1)],
          "outputs": [{"path": n} for n in sorted(names)]}
with open(os.path.join(folder, "record.json"), "w") as f:
    json.dump(record, f)

path = os.path.join(folder, "parcels-in.gpkg")
source = ogr.GetDriverByName("GPKG").CreateDataSource(path)
layer = source.CreateLayer("plots", crs, ogr.wkbPolygon)
layer.CreateField(ogr.FieldDefn("parcel_id", ogr.OFTString))
layer.StartTransaction()
side = cells * STEP
for p in range(parcels):
    x, y, r = WEST + side * rng.random(), NORTH - side * rng.random(), STEP * np.exp(rng.uniform(0, np.log(20)))
    angles = np.sort(rng.random(100)) * 2 * np.pi
    radii = r * (0.7 + 0.3 * rng.random(100))
    ring = ogr.Geometry(ogr.wkbLinearRing)
    for a, d in zip(angles, radii):
        ring.AddPoint_2D(x + d * np.cos(a), y + d * np.sin(a))
    ring.CloseRings()
    polygon = ogr.Geometry(ogr.wkbPolygon)
    polygon.AddGeometry(ring)
    feature = ogr.Feature(layer.GetLayerDefn())
    feature.SetField("parcel_id", "B%05d" % p)
    feature.SetGeometry(polygon)
    layer.CreateFeature(feature)
layer.CommitTransaction()
source = None
print("made in", folder)
