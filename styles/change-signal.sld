<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>change-signal</Name>
    <UserStyle>
      <Name>change-signal</Name>
      <Title>Signal of the members</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>change-signal</Name>
          <Title>Signal of the members</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#1d4e89" quantity="1" label="robust signal" opacity="1"/>
              <ColorMapEntry color="#e6dfc8" quantity="2" label="no change or no robust signal" opacity="1"/>
              <ColorMapEntry color="#f0a94a" quantity="3" label="conflicting signals" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
