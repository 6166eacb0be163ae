<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="0" classificationMax="6">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="0" maximumValue="6" labelPrecision="2">
          <item value="0" label="0 K/km" color="#f3f1e2" alpha="255"/>
          <item value="1" label="1 K/km" color="#c0d3aa" alpha="255"/>
          <item value="2" label="2 K/km" color="#8eb392" alpha="255"/>
          <item value="3" label="3 K/km" color="#619382" alpha="255"/>
          <item value="4" label="4 K/km" color="#3f7077" alpha="255"/>
          <item value="5" label="5 K/km" color="#274f62" alpha="255"/>
          <item value="6" label="6 K/km" color="#14304a" alpha="255"/>
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
