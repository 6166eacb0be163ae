<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>lapse-rate</Name>
    <UserStyle>
      <Name>lapse-rate</Name>
      <Title>Lapse rate (K/km)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>lapse-rate</Name>
          <Title>Lapse rate (K/km)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#3a2566" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#3a2566" quantity="-8" label="-8 K/km" opacity="1"/>
              <ColorMapEntry color="#6a54a0" quantity="-5" label="-5 K/km" opacity="1"/>
              <ColorMapEntry color="#a597c9" quantity="-2" label="-2 K/km" opacity="1"/>
              <ColorMapEntry color="#e6e4dc" quantity="0" label="0 K/km" opacity="1"/>
              <ColorMapEntry color="#cdbf6e" quantity="3" label="+3 K/km" opacity="1"/>
              <ColorMapEntry color="#8f7f22" quantity="6" label="+6 K/km" opacity="1"/>
              <ColorMapEntry color="#544503" quantity="9" label="+9 K/km" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
