<?xml version="1.0" encoding="UTF-8"?>
<StyledLayerDescriptor xmlns="http://www.opengis.net/sld" xmlns:ogc="http://www.opengis.net/ogc" xmlns:se="http://www.opengis.net/se" version="1.1.0">
 <NamedLayer><se:Name>suitability</se:Name><UserStyle><se:Name>suitability</se:Name><se:FeatureTypeStyle>
  <se:Rule><se:Name>secure</se:Name><ogc:Filter><ogc:PropertyIsEqualTo><ogc:PropertyName>class_code</ogc:PropertyName><ogc:Literal>1</ogc:Literal></ogc:PropertyIsEqualTo></ogc:Filter><se:PolygonSymbolizer><se:Fill><se:SvgParameter name="fill">#2166ac</se:SvgParameter></se:Fill></se:PolygonSymbolizer></se:Rule>
  <se:Rule><se:Name>workable</se:Name><ogc:Filter><ogc:PropertyIsEqualTo><ogc:PropertyName>class_code</ogc:PropertyName><ogc:Literal>2</ogc:Literal></ogc:PropertyIsEqualTo></ogc:Filter><se:PolygonSymbolizer><se:Fill><se:SvgParameter name="fill">#92c5de</se:SvgParameter></se:Fill></se:PolygonSymbolizer></se:Rule>
  <se:Rule><se:Name>marginal</se:Name><ogc:Filter><ogc:PropertyIsEqualTo><ogc:PropertyName>class_code</ogc:PropertyName><ogc:Literal>3</ogc:Literal></ogc:PropertyIsEqualTo></ogc:Filter><se:PolygonSymbolizer><se:Fill><se:SvgParameter name="fill">#f4a582</se:SvgParameter></se:Fill></se:PolygonSymbolizer></se:Rule>
  <se:Rule><se:Name>unfit</se:Name><ogc:Filter><ogc:PropertyIsEqualTo><ogc:PropertyName>class_code</ogc:PropertyName><ogc:Literal>4</ogc:Literal></ogc:PropertyIsEqualTo></ogc:Filter><se:PolygonSymbolizer><se:Fill><se:SvgParameter name="fill">#b2182b</se:SvgParameter></se:Fill></se:PolygonSymbolizer></se:Rule>
 </se:FeatureTypeStyle></UserStyle></NamedLayer>
</StyledLayerDescriptor>
