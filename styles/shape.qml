<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-0.5" classificationMax="0.5">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-0.5" maximumValue="0.5" labelPrecision="2">
          <item value="-0.5" label="-0.5" color="#3a2566" alpha="255"/>
          <item value="-0.3" label="-0.3" color="#6a54a0" alpha="255"/>
          <item value="-0.15" label="-0.15" color="#a597c9" alpha="255"/>
          <item value="0" label="0.0" color="#e6e4dc" alpha="255"/>
          <item value="0.15" label="0.15" color="#cdbf6e" alpha="255"/>
          <item value="0.3" label="0.3" color="#8f7f22" alpha="255"/>
          <item value="0.5" label="0.5" color="#544503" alpha="255"/>
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
