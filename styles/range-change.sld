<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>range-change</Name>
    <UserStyle>
      <Name>range-change</Name>
      <Title>Range</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>range-change</Name>
          <Title>Range</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#7fb6d6" quantity="1" label="kept" opacity="1"/>
              <ColorMapEntry color="#1d4e89" quantity="2" label="gained" opacity="1"/>
              <ColorMapEntry color="#7a2018" quantity="3" label="lost" opacity="1"/>
              <ColorMapEntry color="#e6dfc8" quantity="4" label="never suitable" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
