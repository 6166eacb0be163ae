"""open_styled.py FILE.tif...

Opens rasters in headless QGIS with the style beside them, draws them, and prints one line each:
renderer, legend, whether the time range is on, and whether a coloured pixel was drawn.
Needs python3-qgis.
"""
import os
import sys

os.environ["QT_QPA_PLATFORM"] = "offscreen"
from qgis.core import QgsApplication, QgsMapRendererSequentialJob, QgsMapSettings, QgsRasterLayer
from qgis.PyQt.QtCore import QSize
from qgis.PyQt.QtGui import QColor

app = QgsApplication([], False)
app.initQgis()
for path in sys.argv[1:]:
    layer = QgsRasterLayer(path, "layer")
    _, styled = layer.loadDefaultStyle()
    renderer = layer.renderer()
    if renderer.type() == "paletted":
        legend = [c.label for c in renderer.classes()]
    else:
        legend = [i.label for i in renderer.shader().rasterShaderFunction().colorRampItemList()]
    settings = QgsMapSettings()
    settings.setLayers([layer])
    settings.setDestinationCrs(layer.crs())
    settings.setExtent(layer.extent())
    settings.setOutputSize(QSize(200, 150))
    settings.setBackgroundColor(QColor(255, 255, 255))
    job = QgsMapRendererSequentialJob(settings)
    job.start()
    job.waitForFinished()
    image = job.renderedImage()
    drawn = {image.pixel(x, y) & 0xFFFFFF for x in range(200) for y in range(150)} - {0xFFFFFF}
    print(styled, renderer.type(), legend, layer.temporalProperties().isActive(), len(drawn) > 2)
sys.stdout.flush()
os._exit(0)  # QGIS 3.22 may crash while it is torn down without a display
