<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>fit-correlation</Name>
    <UserStyle>
      <Name>fit-correlation</Name>
      <Title>Correlation of the probability plot</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>fit-correlation</Name>
          <Title>Correlation of the probability plot</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#ece6da" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#ece6da" quantity="0.9" label="0.9" opacity="1"/>
              <ColorMapEntry color="#d4cad9" quantity="0.93" label="0.93" opacity="1"/>
              <ColorMapEntry color="#b3a5c5" quantity="0.95" label="0.95" opacity="1"/>
              <ColorMapEntry color="#9081b2" quantity="0.965" label="0.965" opacity="1"/>
              <ColorMapEntry color="#6c5f9f" quantity="0.98" label="0.98" opacity="1"/>
              <ColorMapEntry color="#4a4082" quantity="0.99" label="0.99" opacity="1"/>
              <ColorMapEntry color="#2a2363" quantity="1" label="1.0" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
