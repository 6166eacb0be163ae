<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-8" classificationMax="9">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-8" maximumValue="9" labelPrecision="2">
          <item value="-8" label="-8 K/km" color="#3a2566" alpha="255"/>
          <item value="-5" label="-5 K/km" color="#6a54a0" alpha="255"/>
          <item value="-2" label="-2 K/km" color="#a597c9" alpha="255"/>
          <item value="0" label="0 K/km" color="#e6e4dc" alpha="255"/>
          <item value="3" label="+3 K/km" color="#cdbf6e" alpha="255"/>
          <item value="6" label="+6 K/km" color="#8f7f22" alpha="255"/>
          <item value="9" label="+9 K/km" color="#544503" alpha="255"/>
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
