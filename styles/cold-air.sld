<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>cold-air</Name>
    <UserStyle>
      <Name>cold-air</Name>
      <Title>Cold air</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>cold-air</Name>
          <Title>Cold air</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#3b3f8f" quantity="1" label="prone to cold air" opacity="1"/>
              <ColorMapEntry color="#a9b7a6" quantity="2" label="neutral" opacity="1"/>
              <ColorMapEntry color="#e9c46a" quantity="3" label="not prone" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
