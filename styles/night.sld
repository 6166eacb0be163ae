<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>night</Name>
    <UserStyle>
      <Name>night</Name>
      <Title>Days since the first day of the window</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>night</Name>
          <Title>Days since the first day of the window</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="ramp">
              <ColorMapEntry color="#f5efd0" quantity="-9999" label="no data" opacity="0"/>
              <ColorMapEntry color="#f5efd0" quantity="0" label="day 0" opacity="1"/>
              <ColorMapEntry color="#d7d5a0" quantity="30" label="day 30" opacity="1"/>
              <ColorMapEntry color="#adbd8c" quantity="60" label="day 60" opacity="1"/>
              <ColorMapEntry color="#74a68e" quantity="90" label="day 90" opacity="1"/>
              <ColorMapEntry color="#538b8d" quantity="120" label="day 120" opacity="1"/>
              <ColorMapEntry color="#3d6e89" quantity="150" label="day 150" opacity="1"/>
              <ColorMapEntry color="#2f527c" quantity="180" label="day 180" opacity="1"/>
              <ColorMapEntry color="#2b3765" quantity="210" label="day 210" opacity="1"/>
              <ColorMapEntry color="#241c4f" quantity="240" label="day 240" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
