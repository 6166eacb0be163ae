#!/usr/bin/python3
"""Makes src/test/resources/crs/points.csv: coordinates computed by PROJ through pyproj, longitude or easting first.

    /usr/bin/python3 src/test/python/crs_points.py src/test/resources/crs/points.csv

Definitions that have no code are given as PROJ strings and named; the test builds the same systems from CF grid mappings.
"""
import math
import sys

import pyproj

SYSTEMS = {
    "EPSG:2056": ("EPSG:2056", [(7.43864, 46.95108), (8.5, 47.3), (6.1, 46.2)]),
    "EPSG:3035": ("EPSG:3035", [(5.0, 50.0), (25.3, 60.1), (-9.0, 38.7)]),
    "EPSG:32632": ("EPSG:32632", [(9.0, 47.0), (12.0, 47.0), (6.2, -3.0)]),
    "EPSG:32719": ("EPSG:32719", [(-70.0, -33.0), (-67.0, -20.0)]),
    "EPSG:3857": ("EPSG:3857", [(11.0, 48.0), (-123.4, -45.6)]),
    "EPSG:31287": ("EPSG:31287", [(13.3, 47.5), (16.4, 48.2)]),
    "EPSG:28992": ("EPSG:28992", [(5.3876, 52.1561), (4.9, 52.4)]),
    "EPSG:27700": ("EPSG:27700", [(-2.0, 52.0), (0.1, 51.5)]),
    "EPSG:2263": ("EPSG:2263", [(-74.0, 40.7), (-72.5, 40.9)]),
    "EPSG:3031": ("EPSG:3031", [(0.0, -75.0), (135.0, -66.0)]),
    "EPSG:32661": ("EPSG:32661", [(10.0, 85.0), (-150.0, 70.0)]),
    "EPSG:5070": ("EPSG:5070", [(-96.0, 40.0), (-120.5, 45.2)]),
    "lcc2": ("+proj=lcc +lat_1=25 +lat_2=60 +lat_0=42.5 +lon_0=-100 +ellps=WGS84", [(-95.0, 40.0), (-120.0, 55.0)]),
    "lcc1-sphere": ("+proj=lcc +lat_1=48.6 +lat_0=48.6 +lon_0=8 +x_0=2937018.5829291 +y_0=2937031.41074803 +R=6371229",
                    [(8.0, 48.6), (15.0, 42.0)]),
    "laea-sphere": ("+proj=laea +lat_0=54.9 +lon_0=-2.5 +R=6371229", [(-2.5, 54.9), (3.0, 51.0)]),
    "aea": ("+proj=aea +lat_1=29.5 +lat_2=45.5 +lat_0=23 +lon_0=-96 +ellps=GRS80", [(-96.0, 40.0), (-120.5, 45.2)]),
    "stere-north": ("+proj=stere +lat_0=90 +lat_ts=60 +lon_0=25 +R=6371229", [(25.0, 62.0), (10.0, 55.0)]),
    "stere": ("+proj=stere +lat_0=52 +lon_0=10 +k=0.9999 +ellps=WGS84", [(10.0, 52.0), (14.0, 49.0)]),
    "tmerc-wide": ("+proj=tmerc +lat_0=0 +lon_0=9 +k=0.9996 +x_0=500000 +ellps=WGS84", [(15.0, 47.0), (29.0, 47.0), (-20.0, 60.0)]),
    "merc": ("+proj=merc +lat_ts=20 +lon_0=110 +ellps=WGS84", [(115.0, -8.0), (95.0, 5.0)]),
    "rotated": ("+proj=ob_tran +o_proj=longlat +o_lon_p=0 +o_lat_p=39.25 +lon_0=18 +R=6371229",
                [(18.0, 50.75), (10.0, 50.0), (-10.0, 36.0), (60.0, 70.0)]),
    "rotated-turned": ("+proj=ob_tran +o_proj=longlat +o_lon_p=35 +o_lat_p=40 +lon_0=10 +R=6371229",
                       [(12.0, 50.0), (10.0, 47.0)]),
}

with open(sys.argv[1], "w", encoding="ascii") as out:
    out.write("# PROJ %s through pyproj %s; longitude, latitude on the system's own datum for PROJ strings, WGS 84 for codes\n"
              % (pyproj.proj_version_str, pyproj.__version__))
    out.write("system,longitude,latitude,x,y\n")
    for name, (text, points) in SYSTEMS.items():
        if name.startswith("EPSG"):
            # The seven-parameter transformations, not the grids that may or may not be installed.
            group = pyproj.transformer.TransformerGroup("EPSG:4326", text, always_xy=True, allow_ballpark=False)
            best = [t for t in group.transformers if "grid" not in t.definition]
            forward = best[0].transform
        else:
            forward = pyproj.Proj(text)
        for lon, lat in points:
            x, y = forward(lon, lat)
            if name.startswith("rotated"):
                x, y = math.degrees(x), math.degrees(y)
            out.write("%s,%s,%s,%.6f,%.6f\n" % (name, lon, lat, x, y))
