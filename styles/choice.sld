<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>choice</Name>
    <UserStyle>
      <Name>choice</Name>
      <Title>Cultivars that meet the target</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>choice</Name>
          <Title>Cultivars that meet the target</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#5f5550" quantity="0" label="no cultivar" opacity="1"/>
              <ColorMapEntry color="#efe8c8" quantity="1" label="1 cultivar" opacity="1"/>
              <ColorMapEntry color="#aeccab" quantity="2" label="2 cultivars" opacity="1"/>
              <ColorMapEntry color="#77aba0" quantity="3" label="3 cultivars" opacity="1"/>
              <ColorMapEntry color="#3f89a0" quantity="4" label="4 cultivars" opacity="1"/>
              <ColorMapEntry color="#32648e" quantity="5" label="5 cultivars" opacity="1"/>
              <ColorMapEntry color="#20407c" quantity="6" label="6 cultivars" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
