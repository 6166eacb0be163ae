package org.wintersill.cli;

import java.util.function.Consumer;
import org.wintersill.config.RunConfig;

/** Remembers what it was asked and does as told. */
final class FakeCommands implements Commands {
    String called = "";
    RunConfig config;
    MapOptions mapOptions;
    ExplainOptions explainOptions;
    CurvesOptions curvesOptions;
    ParcelsOptions parcelsOptions;
    InspectOptions inspectOptions;
    int answer;
    Consumer<Console> work = console -> { };

    @Override
    public int map(RunConfig given, MapOptions options, Console console) {
        mapOptions = options;
        return done("map", given, console);
    }

    @Override
    public void check(RunConfig given, boolean overwrite) {
        config = given;
    }

    @Override
    public int plan(RunConfig given, PlanOptions options, Console console) {
        return done("plan", given, console);
    }

    @Override
    public java.util.List<org.wintersill.config.Setting> settings(java.nio.file.Path folder, Console console) {
        return java.util.List.of();
    }

    @Override
    public int compare(CompareOptions options, Console console) {
        return done("compare", null, console);
    }

    @Override
    public int inspect(InspectOptions options, Console console) {
        inspectOptions = options;
        return done("inspect", null, console);
    }

    @Override
    public int explain(RunConfig given, ExplainOptions options, Console console) {
        explainOptions = options;
        return done("explain", given, console);
    }

    @Override
    public int stations(RunConfig given, java.nio.file.Path table, ExplainOptions.Format format, Console console) {
        return done("stations", given, console);
    }

    @Override
    public int curves(CurvesOptions options, Console console) {
        curvesOptions = options;
        return done("curves", null, console);
    }

    @Override
    public int parcels(ParcelsOptions options, Console console) {
        parcelsOptions = options;
        return done("parcels", null, console);
    }

    private int done(String name, RunConfig given, Console console) {
        called = name;
        config = given;
        work.accept(console);
        return answer;
    }
}
