<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="1" classificationMax="50">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="1" maximumValue="50" labelPrecision="2">
          <item value="1" label="1 year" color="#3d1020" alpha="255"/>
          <item value="2" label="2 years" color="#732d2e" alpha="255"/>
          <item value="5" label="5 years" color="#a3553b" alpha="255"/>
          <item value="10" label="10 years" color="#cb844a" alpha="255"/>
          <item value="20" label="20 years" color="#dcbc7e" alpha="255"/>
          <item value="50" label="50 years" color="#eef0dc" alpha="255"/>
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
