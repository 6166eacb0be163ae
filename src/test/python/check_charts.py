#!/usr/bin/env python3
"""Charts looked at by programs that are not ours: the SVG is drawn by librsvg and compared with the PNG, and both are well-formed.

Usage: check_charts.py WINTERSILL.jar FOLDER. Closes with `N passed, N failed`.
"""
import os
import subprocess
import sys
import xml.etree.ElementTree

import numpy
from osgeo import gdal

gdal.UseExceptions()
JAR, FOLDER = sys.argv[1], sys.argv[2]
SVG = "{http://www.w3.org/2000/svg}"
CHARTS = {
    "explain": ["explain", "sample-grids/run.yaml", "--at", "-37.30,50.02", "--winter", "2009-10", "--cultivar", "slate"],
    "curves": ["curves", "sample-grids/cultivars.yaml", "--cultivar", "amber", "--cultivar", "slate"],
    "series": ["curves", "built-in:grapevine-concord", "--series", "sample-grids/series.csv", "--winter", "2009-10"],
    "fit": ["curves", "--fit", "sample-grids/field.csv", "--model", "dated", "--replicates", "0"],
}
passed = failed = 0


def check(name, good, what=""):
    global passed, failed
    passed, failed = passed + bool(good), failed + (not good)
    print(("ok     " if good else "FAILED ") + name + ("" if good else ": " + what))


def pixels(path):
    return gdal.Open(path).ReadAsArray()[:3].astype(float)


def coarse(image, cell=16):
    """Means of squares: letters of two fonts are alike then, lines and areas keep their place."""
    rows, columns = (n // cell * cell for n in image.shape[1:])
    return image[:, :rows, :columns].reshape(3, rows // cell, cell, columns // cell, cell).mean(axis=(2, 4))


os.makedirs(FOLDER, exist_ok=True)
for name, command in CHARTS.items():
    files = {kind: os.path.join(FOLDER, f"{name}.{kind}") for kind in ("svg", "png")}
    for path in files.values():
        run = subprocess.run(["java", "-jar", JAR, *command, "--chart", path, "--overwrite"], capture_output=True, text=True)
        check(f"{os.path.basename(path)} is drawn", run.returncode == 0, run.stderr[-300:])
    root = xml.etree.ElementTree.parse(files["svg"]).getroot()
    kinds = {element.tag.replace(SVG, "") for element in root.iter()}
    check(f"{name}.svg holds shapes and texts alone", kinds <= {"svg", "title", "desc", "path", "g", "circle", "text"}, str(kinds))
    check(f"{name}.svg has a title and a description", root.find(SVG + "title").text and root.find(SVG + "desc").text)
    again = os.path.join(FOLDER, f"{name}-rsvg.png")
    drawn = subprocess.run(["rsvg-convert", "-z", "2", files["svg"], "-o", again], capture_output=True, text=True)
    check(f"{name}.svg is drawn by librsvg without a word", drawn.returncode == 0 and not drawn.stderr, drawn.stderr)
    ours, theirs = pixels(files["png"]), pixels(again)
    check(f"{name}: both have one size", ours.shape == theirs.shape, f"{ours.shape} {theirs.shape}")
    apart = numpy.abs(coarse(ours) - coarse(theirs))
    check(f"{name}: both show the same", apart.mean() < 3 and numpy.mean(apart > 60) < 0.01,
          f"mean difference {apart.mean():.2f}, far apart {numpy.mean(apart > 60):.4f}")
print(f"{passed} passed, {failed} failed")
sys.exit(1 if failed else 0)
