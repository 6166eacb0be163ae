#!/usr/bin/python3
"""Opens layers in QGIS without a display, as a user's double click would, and draws them.

  open_in_qgis.py PICTURE_FOLDER FILE.tif|FILE.gpkg ...

For each layer: valid, with a CRS, the default style found and applied, no plain grey or single-symbol renderer, the picture not blank.
One line a layer, `ok name` or `FAILED name: reasons`; pictures are saved as PNG. Exits 1 on a failure. Needs python3-qgis and qgis-providers.
"""
import os
import sys
import tempfile

os.environ.setdefault("QT_QPA_PLATFORM", "offscreen")
PROFILE = tempfile.mkdtemp()
os.environ.setdefault("XDG_RUNTIME_DIR", PROFILE)
os.environ.setdefault("QGIS_CUSTOM_CONFIG_PATH", PROFILE)

import numpy as np
from qgis.core import (QgsApplication, QgsMapRendererSequentialJob, QgsMapSettings, QgsProviderRegistry, QgsRasterLayer, QgsVectorLayer)
from qgis.PyQt.QtCore import QSize
from qgis.PyQt.QtGui import QColor, QImage

PLAIN = {"singlebandgray", "multibandcolor", "singleSymbol", "nullSymbol"}
UNDRAWN = {"layer_styles", "parcel_winters"}          # tables that come without geometry
WIDTH, HEIGHT = 480, 360


def layers_of(path):
    """(name, layer) of each thing to draw in a file."""
    if path.endswith(".tif"):
        return [(path, QgsRasterLayer(path, os.path.basename(path), "gdal"))]
    found = QgsProviderRegistry.instance().querySublayers(path)
    return [("%s|%s" % (path, s.name()), QgsVectorLayer(s.uri(), s.name(), "ogr")) for s in found if s.providerKey() == "ogr" and s.name() not in UNDRAWN]


def draw(layer, picture):
    """Share of cells painted and number of colours."""
    settings = QgsMapSettings()
    settings.setLayers([layer])
    settings.setDestinationCrs(layer.crs())
    settings.setExtent(layer.extent())
    settings.setOutputSize(QSize(WIDTH, HEIGHT))
    settings.setBackgroundColor(QColor(255, 255, 255, 0))
    job = QgsMapRendererSequentialJob(settings)
    job.start()
    job.waitForFinished()
    image = job.renderedImage()
    image.save(picture)
    image = image.convertToFormat(QImage.Format_RGBA8888)
    bits = image.constBits()
    bits.setsize(image.byteCount())
    a = np.frombuffer(bits, np.uint8).reshape(image.height(), image.bytesPerLine() // 4, 4)[:, :image.width()]
    painted = a[..., 3] > 0
    colours = np.unique(a[painted][:, :3], axis=0)
    return painted.mean(), len(colours)


def all_missing(layer):
    """A raster whose first band has no value at all may be blank."""
    from qgis.core import QgsRasterBandStats
    return layer.type() == layer.RasterLayer and layer.dataProvider().bandStatistics(1, QgsRasterBandStats.All).elementCount == 0


def check(name, layer, folder, number):
    if not layer.isValid():
        return ["QGIS cannot open it"], ""
    wrong = []
    if not layer.crs().isValid():
        wrong.append("no CRS")
    if layer.type() == layer.VectorLayer and layer.geometryType() == 4:
        return wrong, "table, nothing to draw"
    message, found = layer.loadDefaultStyle()
    if not found:
        wrong.append("no default style: %s" % message.strip()[:120])
    kind = layer.renderer().type() if layer.renderer() else "none"
    if kind in PLAIN and not (layer.type() == layer.VectorLayer and layer.geometryType() == 0 and found):
        wrong.append("plain renderer " + kind)
    picture = os.path.join(folder, "%03d-%s.png" % (number, os.path.basename(name).replace("|", "-").replace(".", "-")))
    painted, colours = draw(layer, picture)
    if painted == 0 and not all_missing(layer):
        wrong.append("blank picture")
    return wrong, "%s, %.0f%% painted, %d colours" % (kind, 100 * painted, colours)


def main(folder, paths):
    os.makedirs(folder, exist_ok=True)
    QgsApplication.setPrefixPath("/usr", True)
    app = QgsApplication([], False)
    app.initQgis()
    failed = number = 0
    for path in paths:
        found = layers_of(path)
        if not found:
            found = [(path, QgsVectorLayer(path, "", "ogr"))]
        for name, layer in found:
            number += 1
            wrong, text = check(name, layer, folder, number)
            failed += bool(wrong)
            short = "QGIS " + "/".join(name.split("/")[-3:])
            print("FAILED %s: %s" % (short, "; ".join(wrong)) if wrong else "ok     %s: %s" % (short, text), flush=True)
    # Tearing QGIS down crashes now and then after the work is done; leave without it.
    os._exit(1 if failed else 0)


if __name__ == "__main__":
    if len(sys.argv) < 3:
        sys.exit(__doc__)
    main(sys.argv[1], sys.argv[2:])
