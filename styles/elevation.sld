<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>elevation</Name>
    <UserStyle>
      <Name>elevation</Name>
      <Title>Ground height (m)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>elevation</Name>
          <Title>Ground height (m)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#f3f1e2" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#f3f1e2" quantity="0" label="0 m" opacity="1"/>
              <ColorMapEntry color="#c0d3aa" quantity="200" label="200 m" opacity="1"/>
              <ColorMapEntry color="#8eb392" quantity="500" label="500 m" opacity="1"/>
              <ColorMapEntry color="#619382" quantity="1000" label="1000 m" opacity="1"/>
              <ColorMapEntry color="#3f7077" quantity="1500" label="1500 m" opacity="1"/>
              <ColorMapEntry color="#274f62" quantity="2200" label="2200 m" opacity="1"/>
              <ColorMapEntry color="#14304a" quantity="3000" label="3000 m" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
