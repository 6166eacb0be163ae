<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="0.9" classificationMax="1">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="0.9" maximumValue="1" labelPrecision="2">
          <item value="0.9" label="0.9" color="#ece6da" alpha="255"/>
          <item value="0.93" label="0.93" color="#d4cad9" alpha="255"/>
          <item value="0.95" label="0.95" color="#b3a5c5" alpha="255"/>
          <item value="0.965" label="0.965" color="#9081b2" alpha="255"/>
          <item value="0.98" label="0.98" color="#6c5f9f" alpha="255"/>
          <item value="0.99" label="0.99" color="#4a4082" alpha="255"/>
          <item value="1" label="1.0" color="#2a2363" alpha="255"/>
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
