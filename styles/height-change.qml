<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="-600" classificationMax="600">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="-600" maximumValue="600" labelPrecision="2">
          <item value="-600" label="-600 m" color="#3a2566" alpha="255"/>
          <item value="-300" label="-300 m" color="#6a54a0" alpha="255"/>
          <item value="-100" label="-100 m" color="#a597c9" alpha="255"/>
          <item value="0" label="0 m" color="#e6e4dc" alpha="255"/>
          <item value="100" label="+100 m" color="#cdbf6e" alpha="255"/>
          <item value="300" label="+300 m" color="#8f7f22" alpha="255"/>
          <item value="600" label="+600 m" color="#544503" alpha="255"/>
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
