<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-8" classificationMax="8">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-8" maximumValue="8" labelPrecision="2">
          <item value="-8" label="-8 K" color="#4f1710" alpha="255"/>
          <item value="-4" label="-4 K" color="#96381a" alpha="255"/>
          <item value="-2" label="-2 K" color="#cc6a2a" alpha="255"/>
          <item value="-1" label="-1 K" color="#edb27c" alpha="255"/>
          <item value="0" label="0 K" color="#ebe4cb" alpha="255"/>
          <item value="1" label="+1 K" color="#acd0dd" alpha="255"/>
          <item value="2" label="+2 K" color="#5b9fc4" alpha="255"/>
          <item value="4" label="+4 K" color="#2a659f" alpha="255"/>
          <item value="8" label="+8 K" color="#152f5c" alpha="255"/>
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
