<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-40" classificationMax="10">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-40" maximumValue="10" labelPrecision="2">
          <item value="-40" label="-40 °C" color="#1d1238" alpha="255"/>
          <item value="-35" label="-35 °C" color="#292358" alpha="255"/>
          <item value="-30" label="-30 °C" color="#353579" alpha="255"/>
          <item value="-25" label="-25 °C" color="#3e4c91" alpha="255"/>
          <item value="-20" label="-20 °C" color="#41669c" alpha="255"/>
          <item value="-15" label="-15 °C" color="#3f81a7" alpha="255"/>
          <item value="-10" label="-10 °C" color="#5b99ab" alpha="255"/>
          <item value="-5" label="-5 °C" color="#73b2ad" alpha="255"/>
          <item value="0" label="0 °C" color="#98c9b2" alpha="255"/>
          <item value="5" label="5 °C" color="#c6dcba" alpha="255"/>
          <item value="10" label="10 °C" color="#f3f0c2" alpha="255"/>
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
