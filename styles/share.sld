<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>share</Name>
    <UserStyle>
      <Name>share</Name>
      <Title>Share</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>share</Name>
          <Title>Share</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#ece6da" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#ece6da" quantity="0" label="0 %" opacity="1"/>
              <ColorMapEntry color="#d4cad9" quantity="0.1" label="10 %" opacity="1"/>
              <ColorMapEntry color="#b3a5c5" quantity="0.2" label="20 %" opacity="1"/>
              <ColorMapEntry color="#9081b2" quantity="0.4" label="40 %" opacity="1"/>
              <ColorMapEntry color="#6c5f9f" quantity="0.6" label="60 %" opacity="1"/>
              <ColorMapEntry color="#4a4082" quantity="0.8" label="80 %" opacity="1"/>
              <ColorMapEntry color="#2a2363" quantity="1" label="100 %" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
