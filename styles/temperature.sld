<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>temperature</Name>
    <UserStyle>
      <Name>temperature</Name>
      <Title>Minimum temperature (°C)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>temperature</Name>
          <Title>Minimum temperature (°C)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#1d1238" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#1d1238" quantity="-40" label="-40 °C" opacity="1"/>
              <ColorMapEntry color="#292358" quantity="-35" label="-35 °C" opacity="1"/>
              <ColorMapEntry color="#353579" quantity="-30" label="-30 °C" opacity="1"/>
              <ColorMapEntry color="#3e4c91" quantity="-25" label="-25 °C" opacity="1"/>
              <ColorMapEntry color="#41669c" quantity="-20" label="-20 °C" opacity="1"/>
              <ColorMapEntry color="#3f81a7" quantity="-15" label="-15 °C" opacity="1"/>
              <ColorMapEntry color="#5b99ab" quantity="-10" label="-10 °C" opacity="1"/>
              <ColorMapEntry color="#73b2ad" quantity="-5" label="-5 °C" opacity="1"/>
              <ColorMapEntry color="#98c9b2" quantity="0" label="0 °C" opacity="1"/>
              <ColorMapEntry color="#c6dcba" quantity="5" label="5 °C" opacity="1"/>
              <ColorMapEntry color="#f3f0c2" quantity="10" label="10 °C" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
