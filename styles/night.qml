<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="0" classificationMax="240">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="0" maximumValue="240" labelPrecision="2">
          <item value="0" label="day 0" color="#f5efd0" alpha="255"/>
          <item value="30" label="day 30" color="#d7d5a0" alpha="255"/>
          <item value="60" label="day 60" color="#adbd8c" alpha="255"/>
          <item value="90" label="day 90" color="#74a68e" alpha="255"/>
          <item value="120" label="day 120" color="#538b8d" alpha="255"/>
          <item value="150" label="day 150" color="#3d6e89" alpha="255"/>
          <item value="180" label="day 180" color="#2f527c" alpha="255"/>
          <item value="210" label="day 210" color="#2b3765" alpha="255"/>
          <item value="240" label="day 240" color="#241c4f" alpha="255"/>
          <rampLegendSettings useContinuousLegend="0"/>
        </colorrampshader>
      </rastershader>
    </rasterrenderer>
    <brightnesscontrast brightness="0" contrast="0" gamma="1"/>
    <huesaturation saturation="0" grayscaleMode="0" colorizeOn="0"/>
    <rasterresampler maxOversampling="2"/>
  </pipe>
  <blendMode>0</blendMode>
</qgis>
