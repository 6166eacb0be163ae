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
          <item value="0" label="0 K" color="#f4f0df" alpha="255"/>
          <item value="0.5" label="0.5 K" color="#bdd6d6" alpha="255"/>
          <item value="1" label="1 K" color="#8dbac9" alpha="255"/>
          <item value="2" label="2 K" color="#5e9bb8" alpha="255"/>
          <item value="3" label="3 K" color="#3a799e" alpha="255"/>
          <item value="4" label="4 K" color="#22557d" alpha="255"/>
          <item value="6" label="6 K" color="#102d50" alpha="255"/>
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
