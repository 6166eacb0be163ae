<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="paletted" band="1" opacity="1" alphaBand="-1" nodataColor="">
      <rasterTransparency/>
      <colorPalette>
        <paletteEntry value="0" color="#5f5550" alpha="255" label="no cultivar"/>
        <paletteEntry value="1" color="#efe8c8" alpha="255" label="1 cultivar"/>
        <paletteEntry value="2" color="#aeccab" alpha="255" label="2 cultivars"/>
        <paletteEntry value="3" color="#77aba0" alpha="255" label="3 cultivars"/>
        <paletteEntry value="4" color="#3f89a0" alpha="255" label="4 cultivars"/>
        <paletteEntry value="5" color="#32648e" alpha="255" label="5 cultivars"/>
        <paletteEntry value="6" color="#20407c" alpha="255" label="6 cultivars"/>
      </colorPalette>
    </rasterrenderer>
    <brightnesscontrast brightness="0" contrast="0" gamma="1"/>
    <huesaturation saturation="0" grayscaleMode="0" colorizeOn="0"/>
    <rasterresampler maxOversampling="2"/>
  </pipe>
  <blendMode>0</blendMode>
</qgis>
