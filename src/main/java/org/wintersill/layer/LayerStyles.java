package org.wintersill.layer;
import java.util.List;
public final class LayerStyles {
    private static LayerStyle r(String id) { return new LayerStyle.Ramp(id, id, List.of(new LayerStyle.Stop(0, new Colour(0,0,0), "0"), new LayerStyle.Stop(1, new Colour(255,255,255), "1"))); }
    public static LayerStyle margin() { return r("margin"); }
    public static LayerStyle probability() { return r("probability"); }
    public static LayerStyle damage() { return r("damage"); }
    public static LayerStyle temperature() { return r("temperature"); }
    public static LayerStyle night() { return r("night"); }
    public static LayerStyle year() { return r("year"); }
    public static LayerStyle count() { return r("count"); }
    public static LayerStyle returnPeriod() { return r("return-period"); }
    public static LayerStyle requiredHardiness() { return r("required-hardiness"); }
    public static LayerStyle heightChange() { return r("height-change"); }
    public static LayerStyle.Classes suitability() { return new LayerStyle.Classes("suitability", "s", List.of()); }
    public static LayerStyle.Classes choice(int n) { return new LayerStyle.Classes("choice", "s", List.of()); }
}
