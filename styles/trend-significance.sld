<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>trend-significance</Name>
    <UserStyle>
      <Name>trend-significance</Name>
      <Title>Trend beyond chance</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>trend-significance</Name>
          <Title>Trend beyond chance</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#7a2018" quantity="1" label="colder" opacity="1"/>
              <ColorMapEntry color="#e6dfc8" quantity="2" label="no clear trend" opacity="1"/>
              <ColorMapEntry color="#1d4e89" quantity="3" label="milder" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
