package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Stations that read what explain shows, shifted by a known amount: the comparison must find the shift, and leave nothing hidden. */
class StationComparisonTest {
    private static final String RUN = "sample-grids/run-cold-pool.yaml";

    @TempDir
    private Path folder;

    private String readings(String place) {
        String[] lines = Program.run("explain", RUN, "--quiet", "--csv", "--winter", "2009-10", "--cultivar", "slate", "--at", place).expect(0).out()
                .split("\n");
        String[] names = lines[0].split(",");
        int date = java.util.List.of(names).indexOf("date");
        int tmin = java.util.List.of(names).indexOf("tmin_degc");
        StringBuilder table = new StringBuilder();
        for (int i = 1; i < lines.length; i++) {
            String[] cells = lines[i].split(",", -1);
            double shift = i % 2 == 0 ? 1 : 3;
            table.append("S").append(place.hashCode()).append(',').append(place).append(",200,").append(cells[date]).append(',')
                    .append(cells[tmin].isEmpty() ? "" : Double.toString(Double.parseDouble(cells[tmin]) - shift)).append('\n');
        }
        return table.toString();
    }

    @Test
    void theShiftOfTheStationsIsFoundAfterTheLastStep() throws IOException {
        Path file = folder.resolve("stations.csv");
        String first = readings("-37.4975,50.0775");
        String second = readings("-37.2525,50.0175");
        String twice = first.lines().findFirst().orElseThrow();
        Files.writeString(file, "id,x,y,elevation,date,tmin\n" + first + second + twice + "\nfar,3,3,10,2010-01-14,-5\nlate,-37.4975,50.0775,10,2030-01-14,-5\n");
        Program.Ended ended = Program.run("explain", RUN, "--quiet", "--json", "--stations", file.toString()).expect(0);
        JsonNode document = new ObjectMapper().readTree(ended.out());
        assertEquals(1, document.get("left-out").get("station outside of the grid").asInt());
        assertEquals(1, document.get("left-out").get("day not in the temperature record").asInt());
        assertEquals(1, document.get("left-out").get("second reading of a station and day").asInt());
        assertEquals(2, document.get("stations").asInt());
        int compared = 0;
        for (JsonNode group : document.get("groups")) {
            JsonNode last = group.get("steps").get(5);
            assertEquals("offset", last.get("after").asText());
            double bias = last.get("bias").asDouble();
            double rmse = last.get("rmse").asDouble();
            if (group.get("kind").asText().equals("all")) {
                compared = group.get("readings").asInt();
                assertEquals(2, bias, 0.05);
                // Shifts of 1 and 3 in equal parts.
                assertEquals(Math.sqrt(5), rmse, 0.05);
            }
            assertEquals(rmse * rmse - bias * bias, 1, 0.1, group.toString());
        }
        int leftOut = 0;
        for (JsonNode count : document.get("left-out")) {
            leftOut += count.asInt();
        }
        assertEquals(document.get("readings").asInt(), compared + leftOut);
        assertTrue(Program.run("explain", RUN, "--quiet", "--csv", "--stations", file.toString()).expect(0).out()
                .contains("left-out,station outside of the grid,1"));
        assertTrue(Program.run("explain", RUN, "--quiet", "--stations", file.toString()).expect(0).out().contains(compared + " of "));
    }

    @Test
    void linesThatCannotBeUnderstoodAreAllNamed() throws IOException {
        Path file = folder.resolve("bad.csv");
        Files.writeString(file, "id,x,y,elevation,date,tmin\nA,-37.5,50,10,14.1.2010,-5\nB,west,50,10,2010-01-14,250\n");
        Program.Ended ended = Program.run("explain", RUN, "--stations", file.toString()).expect(3);
        assertTrue(ended.err().contains("'14.1.2010' is not a date") && ended.err().contains("'west' is not a number")
                && ended.err().contains("250 is no air temperature") && ended.err().contains("bad.csv:3"), ended.err());
        Files.writeString(file, "id,x,y,date,tmin\n");
        assertTrue(Program.run("explain", RUN, "--stations", file.toString()).expect(3).err().contains("no column elevation"));
    }
}
