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
          <item value="0" label="0 %" color="#ece6da" alpha="255"/>
          <item value="0.1" label="10 %" color="#d4cad9" alpha="255"/>
          <item value="0.2" label="20 %" color="#b3a5c5" alpha="255"/>
          <item value="0.4" label="40 %" color="#9081b2" alpha="255"/>
          <item value="0.6" label="60 %" color="#6c5f9f" alpha="255"/>
          <item value="0.8" label="80 %" color="#4a4082" alpha="255"/>
          <item value="1" label="100 %" color="#2a2363" alpha="255"/>
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
