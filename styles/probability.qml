<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="0" classificationMax="1">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="0" maximumValue="1" labelPrecision="2">
          <item value="0" label="0 %" color="#f5f0da" alpha="255"/>
          <item value="0.02" label="2 %" color="#f1d290" alpha="255"/>
          <item value="0.05" label="5 %" color="#e5ad63" alpha="255"/>
          <item value="0.1" label="10 %" color="#d9874b" alpha="255"/>
          <item value="0.2" label="20 %" color="#c6623b" alpha="255"/>
          <item value="0.35" label="35 %" color="#a5443e" alpha="255"/>
          <item value="0.5" label="50 %" color="#84263f" alpha="255"/>
          <item value="0.75" label="75 %" color="#581936" alpha="255"/>
          <item value="1" label="100 %" color="#2e0d2c" alpha="255"/>
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
