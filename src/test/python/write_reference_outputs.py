#!/usr/bin/python3
"""Writes the layers of check_margins.py's own computation as an output folder, to try the outside checks without the program.

  write_reference_outputs.py RUN_FOLDER OUT_FOLDER [--spoil]

--spoil changes one thing in each of several files, so that the checks must find exactly those: margins by 0.01 K, a probability, a class, a winter label, a missing cell.
GDAL writes the files; styles are the shortest that QGIS accepts.
"""
import hashlib
import json
import os
import sys

import numpy as np
from osgeo import gdal, osr

import check_margins as chain

gdal.UseExceptions()
QML = """<qgis version="3.22" styleCategories="Symbology"><pipe><rasterrenderer type="singlebandpseudocolor" band="1" opacity="1"><rastershader>
<colorrampshader colorRampType="INTERPOLATED"><item value="%.6f" label="low" color="#2166ac" alpha="255"/><item value="%.6f" label="high" color="#b2182b" alpha="255"/>
</colorrampshader></rastershader></rasterrenderer></pipe></qgis>
"""
CLASS_QML = """<qgis version="3.22" styleCategories="Symbology"><pipe><rasterrenderer type="paletted" band="1" opacity="1"><colorPalette>%s</colorPalette></rasterrenderer></pipe></qgis>
"""
COLOURS = ("#1a9850", "#a6d96a", "#fdae61", "#7f3b08")


def write(path, result, bands, words, unit, classes=None):
    os.makedirs(os.path.dirname(path), exist_ok=True)
    kind, fill = (gdal.GDT_Byte, 255) if classes else (gdal.GDT_Float32, -9999.0)
    rows, columns = bands[0].shape
    ds = gdal.GetDriverByName("MEM").Create("", columns, rows, len(bands), kind)
    crs = osr.SpatialReference()
    crs.ImportFromEPSG(4326)
    ds.SetSpatialRef(crs)
    step = result.lon[1] - result.lon[0]
    ds.SetGeoTransform((result.lon[0] - step / 2, step, 0, result.lat[0] + step / 2, 0, -step))
    ds.SetMetadata({"AREA_OR_POINT": "Area", "TIFFTAG_DATETIME": "2018:05:31 00:00:00", "TIFFTAG_SOFTWARE": "reference chain",
                    "TIFFTAG_IMAGEDESCRIPTION": "reference layer (invented data)"})
    for k, values in enumerate(bands):
        band = ds.GetRasterBand(k + 1)
        stored = np.where(np.isnan(values), fill, values).astype(np.uint8 if classes else np.float32)
        band.WriteArray(stored)
        band.SetNoDataValue(fill)
        band.SetDescription(words[k])
        band.SetUnitType(unit)
        x = stored[stored != fill].astype(float)
        if x.size:
            band.SetMetadata({"STATISTICS_MINIMUM": repr(x.min()), "STATISTICS_MAXIMUM": repr(x.max()), "STATISTICS_MEAN": repr(x.mean()),
                              "STATISTICS_STDDEV": repr(x.std()), "STATISTICS_VALID_PERCENT": "%.6f" % (100 * x.size / stored.size)})
    if classes:
        palette = gdal.ColorTable()
        for k, text in enumerate(COLOURS):
            palette.SetColorEntry(k + 1, tuple(int(text[i:i + 2], 16) for i in (1, 3, 5)))
        ds.GetRasterBand(1).SetColorTable(palette)
        ds.GetRasterBand(1).SetColorInterpretation(gdal.GCI_PaletteIndex)
        ds.GetRasterBand(1).SetCategoryNames([""] + list(classes))
    gdal.GetDriverByName("COG").CreateCopy(path, ds, options=["COMPRESS=DEFLATE", "PREDICTOR=%s" % ("NO" if classes else "YES"), "BLOCKSIZE=256",
                                                              "OVERVIEW_RESAMPLING=%s" % ("MODE" if classes else "AVERAGE")])
    present = np.concatenate([b[np.isfinite(b)].ravel() for b in bands] or [np.zeros(1)])
    with open(path[:-4] + ".qml", "w") as f:
        if classes:
            f.write(CLASS_QML % "".join('<paletteEntry value="%d" color="%s" alpha="255" label="%s"/>' % (k + 1, COLOURS[k], c) for k, c in enumerate(classes)))
        else:
            f.write(QML % (present.min() if present.size else 0, present.max() + 1e-3 if present.size else 1))


def main(folder, out, spoil):
    run = chain.read_yaml(os.path.join(folder, "run.yaml"))
    result = chain.compute(folder, run)
    layers, shared = chain.summaries(result, run)
    keep = [k for k in range(len(result.labels)) if result.valid[k].any()]
    labels = [result.labels[k] for k in keep]
    if spoil:
        first = next(iter(layers))
        result.cultivars[first]["margin"][keep[2]] += 0.01
        layers[first]["damage-probability-50"] += 2e-4
        layers[first]["margin-mean"][60, 60] = np.nan
        s = layers[first]["suitability"]
        s[30, 30] = (s[30, 30] + 1) % 4
    path = lambda *parts: os.path.join(out, *parts) + ".tif"
    for name, w in result.cultivars.items():
        for layer, unit in (("margin", "K"), ("damage", "1"), ("night", "d")):
            write(path(name, "winters", "worst-night" if layer == "night" else layer), result, [w[layer][k] for k in keep], labels, unit)
        for layer, values in layers[name].items():
            if layer == "suitability":
                write(path(name, layer), result, [values + 1], [layer], "", chain.CLASS_NAMES)
            elif not layer.startswith("("):
                unit = "K" if layer.startswith(("margin", "required")) else "1"
                write(path(name, layer), result, [values], [layer], unit)
    labels = ["1999-00"] + labels[1:] if spoil else labels
    write(path("shared", "winters", "minimum"), result, [result.minimum[k] for k in keep], labels, "degC")
    for layer, values in shared.items():
        bands = values if isinstance(values, list) else [values]
        write(path("shared", layer), result, bands, ["%s %d" % (layer, k + 1) for k in range(len(bands))], "1")
    digests = {}
    for place, _, names in sorted(os.walk(out)):
        for name in sorted(names):
            with open(os.path.join(place, name), "rb") as f:
                digests[os.path.relpath(os.path.join(place, name), out)] = hashlib.sha256(f.read()).hexdigest()
    with open(os.path.join(out, "record.json"), "w") as f:
        json.dump({"outputs": digests}, f)


if __name__ == "__main__":
    if len(sys.argv) not in (3, 4):
        sys.exit(__doc__)
    main(sys.argv[1], sys.argv[2], "--spoil" in sys.argv)
