<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>temperature-change</Name>
    <UserStyle>
      <Name>temperature-change</Name>
      <Title>Change of the minimum temperature (K)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>temperature-change</Name>
          <Title>Change of the minimum temperature (K)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#4f1710" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#4f1710" quantity="-8" label="-8 K" opacity="1"/>
              <ColorMapEntry color="#96381a" quantity="-4" label="-4 K" opacity="1"/>
              <ColorMapEntry color="#cc6a2a" quantity="-2" label="-2 K" opacity="1"/>
              <ColorMapEntry color="#edb27c" quantity="-1" label="-1 K" opacity="1"/>
              <ColorMapEntry color="#ebe4cb" quantity="0" label="0 K" opacity="1"/>
              <ColorMapEntry color="#acd0dd" quantity="1" label="+1 K" opacity="1"/>
              <ColorMapEntry color="#5b9fc4" quantity="2" label="+2 K" opacity="1"/>
              <ColorMapEntry color="#2a659f" quantity="4" label="+4 K" opacity="1"/>
              <ColorMapEntry color="#152f5c" quantity="8" label="+8 K" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
