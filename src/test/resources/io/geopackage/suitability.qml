<!DOCTYPE qgis PUBLIC 'http://mrcc.com/qgis.dtd' 'SYSTEM'>
<qgis version="3.22.16" styleCategories="Symbology">
 <renderer-v2 type="categorizedSymbol" attr="class_code" symbollevels="0" enableorderby="0" forceraster="0">
  <categories>
   <category value="1" type="long" symbol="0" label="secure" render="true"/>
   <category value="2" type="long" symbol="1" label="workable" render="true"/>
   <category value="3" type="long" symbol="2" label="marginal" render="true"/>
   <category value="4" type="long" symbol="3" label="unfit" render="true"/>
  </categories>
  <symbols>
   <symbol type="fill" name="0" alpha="1"><layer class="SimpleFill" enabled="1" locked="0" pass="0"><prop k="color" v="33,102,172,255"/><prop k="outline_color" v="60,60,60,255"/><prop k="outline_width" v="0.1"/><prop k="style" v="solid"/></layer></symbol>
   <symbol type="fill" name="1" alpha="1"><layer class="SimpleFill" enabled="1" locked="0" pass="0"><prop k="color" v="146,197,222,255"/><prop k="outline_color" v="60,60,60,255"/><prop k="outline_width" v="0.1"/><prop k="style" v="solid"/></layer></symbol>
   <symbol type="fill" name="2" alpha="1"><layer class="SimpleFill" enabled="1" locked="0" pass="0"><prop k="color" v="244,165,130,255"/><prop k="outline_color" v="60,60,60,255"/><prop k="outline_width" v="0.1"/><prop k="style" v="solid"/></layer></symbol>
   <symbol type="fill" name="3" alpha="1"><layer class="SimpleFill" enabled="1" locked="0" pass="0"><prop k="color" v="178,24,43,255"/><prop k="outline_color" v="60,60,60,255"/><prop k="outline_width" v="0.1"/><prop k="style" v="solid"/></layer></symbol>
  </symbols>
 </renderer-v2>
</qgis>
