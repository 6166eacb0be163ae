<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="0" classificationMax="3000">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="0" maximumValue="3000" labelPrecision="2">
          <item value="0" label="0 m" color="#f3f1e2" alpha="255"/>
          <item value="200" label="200 m" color="#c0d3aa" alpha="255"/>
          <item value="500" label="500 m" color="#8eb392" alpha="255"/>
          <item value="1000" label="1000 m" color="#619382" alpha="255"/>
          <item value="1500" label="1500 m" color="#3f7077" alpha="255"/>
          <item value="2200" label="2200 m" color="#274f62" alpha="255"/>
          <item value="3000" label="3000 m" color="#14304a" alpha="255"/>
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
