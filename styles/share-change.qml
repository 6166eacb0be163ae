<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-0.6" classificationMax="0.6">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-0.6" maximumValue="0.6" labelPrecision="2">
          <item value="-0.6" label="-60 %" color="#152f5c" alpha="255"/>
          <item value="-0.3" label="-30 %" color="#2a659f" alpha="255"/>
          <item value="-0.15" label="-15 %" color="#5b9fc4" alpha="255"/>
          <item value="-0.05" label="-5 %" color="#acd0dd" alpha="255"/>
          <item value="0" label="0 %" color="#ebe4cb" alpha="255"/>
          <item value="0.05" label="+5 %" color="#edb27c" alpha="255"/>
          <item value="0.15" label="+15 %" color="#cc6a2a" alpha="255"/>
          <item value="0.3" label="+30 %" color="#96381a" alpha="255"/>
          <item value="0.6" label="+60 %" color="#4f1710" alpha="255"/>
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
