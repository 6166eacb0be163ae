<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>year</Name>
    <UserStyle>
      <Name>year</Name>
      <Title>Winter, by the year in which it ends</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>year</Name>
          <Title>Winter, by the year in which it ends</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#2b1a3d" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#2b1a3d" quantity="1960" label="1960" opacity="1"/>
              <ColorMapEntry color="#4c3469" quantity="1970" label="1970" opacity="1"/>
              <ColorMapEntry color="#6c538f" quantity="1980" label="1980" opacity="1"/>
              <ColorMapEntry color="#8b77af" quantity="1990" label="1990" opacity="1"/>
              <ColorMapEntry color="#af9dc4" quantity="2000" label="2000" opacity="1"/>
              <ColorMapEntry color="#d2c4d6" quantity="2010" label="2010" opacity="1"/>
              <ColorMapEntry color="#efe3d6" quantity="2020" label="2020" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
