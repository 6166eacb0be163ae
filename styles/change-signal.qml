<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="paletted" band="1" opacity="1" alphaBand="-1" nodataColor="">
      <rasterTransparency/>
      <colorPalette>
        <paletteEntry value="1" color="#1d4e89" alpha="255" label="robust signal"/>
        <paletteEntry value="2" color="#e6dfc8" alpha="255" label="no change or no robust signal"/>
        <paletteEntry value="3" color="#f0a94a" alpha="255" label="conflicting signals"/>
      </colorPalette>
    </rasterrenderer>
    <brightnesscontrast brightness="0" contrast="0" gamma="1"/>
    <huesaturation saturation="0" grayscaleMode="0" colorizeOn="0"/>
    <rasterresampler maxOversampling="2"/>
  </pipe>
  <blendMode>0</blendMode>
</qgis>
