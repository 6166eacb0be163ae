<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>count</Name>
    <UserStyle>
      <Name>count</Name>
      <Title>Count</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>count</Name>
          <Title>Count</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#f3f1e2" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#f3f1e2" quantity="0" label="0" opacity="1"/>
              <ColorMapEntry color="#c0d3aa" quantity="5" label="5" opacity="1"/>
              <ColorMapEntry color="#8eb392" quantity="10" label="10" opacity="1"/>
              <ColorMapEntry color="#619382" quantity="15" label="15" opacity="1"/>
              <ColorMapEntry color="#3f7077" quantity="20" label="20" opacity="1"/>
              <ColorMapEntry color="#274f62" quantity="25" label="25" opacity="1"/>
              <ColorMapEntry color="#14304a" quantity="30" label="30" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
