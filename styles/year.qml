<?xml version="1.0" encoding="UTF-8"?>
<qgis version="3.22.0" styleCategories="Symbology">
  <pipe>
    <provider>
      <resampling enabled="false" zoomedInResamplingMethod="nearestNeighbour" zoomedOutResamplingMethod="nearestNeighbour" maxOversampling="2"/>
    </provider>
    <rasterrenderer type="singlebandpseudocolor" band="1" opacity="1" alphaBand="-1" nodataColor="" classificationMin="1960" classificationMax="2020">
      <rasterTransparency/>
      <rastershader>
        <colorrampshader colorRampType="INTERPOLATED" classificationMode="1" clip="0" minimumValue="1960" maximumValue="2020" labelPrecision="2">
          <item value="1960" label="1960" color="#2b1a3d" alpha="255"/>
          <item value="1970" label="1970" color="#4c3469" alpha="255"/>
          <item value="1980" label="1980" color="#6c538f" alpha="255"/>
          <item value="1990" label="1990" color="#8b77af" alpha="255"/>
          <item value="2000" label="2000" color="#af9dc4" alpha="255"/>
          <item value="2010" label="2010" color="#d2c4d6" alpha="255"/>
          <item value="2020" label="2020" color="#efe3d6" alpha="255"/>
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
