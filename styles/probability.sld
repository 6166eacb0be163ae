<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>probability</Name>
    <UserStyle>
      <Name>probability</Name>
      <Title>Probability</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>probability</Name>
          <Title>Probability</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#f5f0da" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#f5f0da" quantity="0" label="0 %" opacity="1"/>
              <ColorMapEntry color="#f1d290" quantity="0.02" label="2 %" opacity="1"/>
              <ColorMapEntry color="#e5ad63" quantity="0.05" label="5 %" opacity="1"/>
              <ColorMapEntry color="#d9874b" quantity="0.1" label="10 %" opacity="1"/>
              <ColorMapEntry color="#c6623b" quantity="0.2" label="20 %" opacity="1"/>
              <ColorMapEntry color="#a5443e" quantity="0.35" label="35 %" opacity="1"/>
              <ColorMapEntry color="#84263f" quantity="0.5" label="50 %" opacity="1"/>
              <ColorMapEntry color="#581936" quantity="0.75" label="75 %" opacity="1"/>
              <ColorMapEntry color="#2e0d2c" quantity="1" label="100 %" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
