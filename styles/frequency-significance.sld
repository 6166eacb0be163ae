<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>frequency-significance</Name>
    <UserStyle>
      <Name>frequency-significance</Name>
      <Title>Killing winters beyond chance</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>frequency-significance</Name>
          <Title>Killing winters beyond chance</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#1d4e89" quantity="1" label="fewer" opacity="1"/>
              <ColorMapEntry color="#e6dfc8" quantity="2" label="no clear change" opacity="1"/>
              <ColorMapEntry color="#7a2018" quantity="3" label="more" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
