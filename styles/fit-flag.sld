<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor version="1.0.0" xsi:schemaLocation="http://www.opengis.net/sld http://schemas.opengis.net/sld/1.0.0/StyledLayerDescriptor.xsd" xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <NamedLayer>
    <Name>fit-flag</Name>
    <UserStyle>
      <Name>fit-flag</Name>
      <Title>Trust in the fit</Title>
      <FeatureTypeStyle>
        <Rule>
          <Name>fit-flag</Name>
          <Title>Trust in the fit</Title>
          <RasterSymbolizer>
            <Opacity>1</Opacity>
            <ColorMap type="values">
              <ColorMapEntry color="#1d4e89" quantity="1" label="no objection" opacity="1"/>
              <ColorMapEntry color="#7fb6d6" quantity="2" label="shape not believed, Gumbel instead" opacity="1"/>
              <ColorMapEntry color="#f0a94a" quantity="3" label="beyond the lowest possible value" opacity="1"/>
              <ColorMapEntry color="#7a2018" quantity="4" label="poor fit" opacity="1"/>
            </ColorMap>
          </RasterSymbolizer>
        </Rule>
      </FeatureTypeStyle>
    </UserStyle>
  </NamedLayer>
</StyledLayerDescriptor>
