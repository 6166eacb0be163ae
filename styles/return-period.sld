<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>return-period</Name>
    <UserStyle>
      <Name>return-period</Name>
      <Title>Return period (years)</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>return-period</Name>
          <Title>Return period (years)</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#3d1020" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#3d1020" quantity="1" label="1 year" opacity="1"/>
              <ColorMapEntry color="#732d2e" quantity="2" label="2 years" opacity="1"/>
              <ColorMapEntry color="#a3553b" quantity="5" label="5 years" opacity="1"/>
              <ColorMapEntry color="#cb844a" quantity="10" label="10 years" opacity="1"/>
              <ColorMapEntry color="#dcbc7e" quantity="20" label="20 years" opacity="1"/>
              <ColorMapEntry color="#eef0dc" quantity="50" label="50 years" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
