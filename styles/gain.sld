<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>gain</Name>
    <UserStyle>
      <Name>gain</Name>
      <Title>Margin gained (K)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>gain</Name>
          <Title>Margin gained (K)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#f4f0df" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#f4f0df" quantity="0" label="0 K" opacity="1"/>
              <ColorMapEntry color="#bdd6d6" quantity="0.5" label="0.5 K" opacity="1"/>
              <ColorMapEntry color="#8dbac9" quantity="1" label="1 K" opacity="1"/>
              <ColorMapEntry color="#5e9bb8" quantity="2" label="2 K" opacity="1"/>
              <ColorMapEntry color="#3a799e" quantity="3" label="3 K" opacity="1"/>
              <ColorMapEntry color="#22557d" quantity="4" label="4 K" opacity="1"/>
              <ColorMapEntry color="#102d50" quantity="6" label="6 K" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
