package org.wintersill.io.geotiff.read;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.regex.Pattern;
import org.wintersill.grid.CrsParser;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.SourceFile;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.temperature.TemperatureFormat;
import org.wintersill.temperature.TemperatureRequest;

/**
 * Daily temperatures in GeoTIFF files whose bands are days: one file a day, a month, a year or any run of days.
 *
 * <p>Opening reads the header alone, so thousands of one-day files open in seconds; the first file of each request also
 * gives a small sample of values, held against the unit. Reference systems are looked up once. Thread-safe.
 *
 * <p>Read: 8 to 32 bit integers, 32 and 64 bit reals; strips and tiles; no compression, LZW, Deflate, PackBits, ZSTD;
 * predictors 1 to 3; BigTIFF; both byte orders; PixelIsPoint; south-up; internal masks. Refused by name: everything else.
 */
public final class GeotiffTemperatureFormat implements TemperatureFormat {
    private static final Map<ForcingVariable, Pattern> OTHER_WORDS = Map.of(
            ForcingVariable.MINIMUM, Pattern.compile("(?i).*(tasmax|tmax|maximum|tmean|tavg|mean).*"),
            ForcingVariable.MAXIMUM, Pattern.compile("(?i).*(tasmin|tmin|minimum|tmean|tavg|mean).*"),
            ForcingVariable.MEAN, Pattern.compile("(?i).*(tasmin|tmin|minimum|tasmax|tmax|maximum).*"));

    private final CrsLookup systems;
    private final Set<TemperatureRequest> sampled = ConcurrentHashMap.newKeySet();

    /** @param parser turns the codes in files and run file into reference systems */
    public GeotiffTemperatureFormat(CrsParser parser) {
        this.systems = new CrsLookup(parser);
    }

    @Override
    public String name() {
        return "GeoTIFF";
    }

    @Override
    public boolean recognises(Path file, byte[] head) {
        return TiffFile.recognises(head);
    }

    @Override
    public DailyTemperatureSource open(Path path, TemperatureRequest request, Notices notices) {
        try (TiffFile file = TiffFile.open(path)) {
            refuseMember(file, request);
            request.variable().ifPresent(v -> notices.add("variable: " + v + " is not used for GeoTIFF files, which hold one quantity"));
            GeotiffHeader header = GeotiffHeader.read(file, systems, request.crs());
            TiffImage image = header.image();
            refuseOtherQuantity(file, header, request.forcing());
            BandDates dates = BandDates.of(file, header.metadata(), image.samples(), request, notices);
            Packing packing = Packing.of(file, header.metadata(), image.samples(), request);
            noteWords(header, request, notices);
            if (!sampled.contains(request) && sample(file, header, packing, dates)) {
                sampled.add(request);
            }
            return new GeotiffTemperatureSource(path, file.size(), systems, request, header.place(), dates, packing, layout(header),
                    describe(file, header, dates, packing));
        }
    }

    private static void refuseMember(TiffFile file, TemperatureRequest request) {
        request.member().ifPresent(m -> {
            throw file.refuse("member: " + m + " was asked for, but a GeoTIFF file has no ensemble members", "Take member: out and name the files of one member");
        });
    }

    private static void refuseOtherQuantity(TiffFile file, GeotiffHeader header, ForcingVariable wanted) {
        Optional<String> text = header.metadata().item("description", 0);
        if (text.isPresent() && OTHER_WORDS.get(wanted).matcher(text.get()).matches()
                && !text.get().toLowerCase(java.util.Locale.ROOT).contains(wanted.word())) {
            throw file.refuse("Band 1 is described as '" + text.get() + "', a daily " + wanted.word() + " is expected",
                    "Give the files with the daily " + wanted.word());
        }
    }

    private static void noteWords(GeotiffHeader header, TemperatureRequest request, Notices notices) {
        if (request.unit().isPresent() && header.metadata().item("unittype", 0).isEmpty()) {
            notices.add("GeoTIFF temperatures are taken to be in " + request.unit().get().symbol() + ", as the run file says");
        }
        if (header.nodata().isEmpty() && header.mask() == null) {
            notices.add("GeoTIFF files without a no-data value: values outside -90..60 degC are taken as missing");
        }
    }

    /** Days of a chunk are the bands that lie in it together. */
    private static StorageLayout layout(GeotiffHeader header) {
        TiffImage image = header.image();
        int rows = Math.min(image.chunkHeight(), image.height());
        int offset = header.place().southUp() ? image.height() % rows : 0;
        return new StorageLayout(image.samplesPerChunk(), rows, Math.min(image.chunkWidth(), image.width()), offset);
    }

    /** @return whether the file had values to judge by */
    private static boolean sample(TiffFile file, GeotiffHeader header, Packing packing, BandDates dates) {
        int band = dates.bands()[dates.bands().length / 2];
        double[] stored = ValueSample.of(new WindowReader(file, header), header, band);
        PlausibleTemperature.check(file, stored, packing, band);
        return stored.length > 0;
    }

    private static SourceFile describe(TiffFile file, GeotiffHeader header, BandDates dates, Packing packing) {
        Map<String, String> details = new LinkedHashMap<>();
        details.put("dates", dates.source());
        if (packing.packed()) {
            details.put("packing", "value = stored * " + packing.scale()[0] + " + " + packing.offset()[0]);
        }
        if (!header.place().change().isEmpty()) {
            details.put("turned", header.place().change());
        }
        if (dates.axis().missingCount() > 0) {
            details.put("days without record", String.join(", ", dates.axis().gaps(10)));
        }
        return new SourceFile(file.path().toString(), file.big() ? "BigTIFF" : "GeoTIFF",
                header.image().samples() + (header.image().samples() == 1 ? " band" : " bands"), packing.unitText(),
                dates.axis().calendar().cfName(), dates.axis().date(0).toString(), dates.axis().date(dates.axis().size() - 1).toString(),
                dates.axis().size(), header.place().grid().describe(), header.storage(), details);
    }
}
