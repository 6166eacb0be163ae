package org.wintersill.io.netcdf;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Locale;
import org.wintersill.problem.Problem;

/** Says what a file is that no reader recognises: mostly something else saved under the name of a grid. */
public final class UnknownContent {
    private UnknownContent() {
    }

    /**
     * The problem with a file that is no grid.
     *
     * @param file the file
     * @param head its first bytes, as many as are at hand
     */
    public static Problem describe(Path file, byte[] head) {
        String where = file.toString();
        if (head.length == 0) {
            return Problem.input("The file is empty", where, "Fetch the file again");
        }
        if (begins(head, 0x1f, 0x8b)) {
            return Problem.input("The file is compressed with gzip", where, "Unpack it first, for example with gunzip");
        }
        if (begins(head, 'P', 'K', 3, 4)) {
            return Problem.input("The file is a ZIP archive", where, "Unpack it first");
        }
        if (begins(head, 'B', 'Z', 'h')) {
            return Problem.input("The file is compressed with bzip2", where, "Unpack it first, for example with bunzip2");
        }
        if (begins(head, 0xfd, '7', 'z', 'X', 'Z')) {
            return Problem.input("The file is compressed with xz", where, "Unpack it first, for example with unxz");
        }
        if (begins(head, 'G', 'R', 'I', 'B')) {
            return Problem.input("The file is GRIB, which is not read", where, "Convert it to netCDF");
        }
        if (begins(head, 0x0e, 0x03, 0x13, 0x01)) {
            return Problem.input("The file is HDF4, which is not read", where, "Convert it to netCDF");
        }
        if (begins(head, 'C', 'D', 'F')) {
            return Problem.input("The file is netCDF of an unknown version " + (head.length > 3 ? head[3] : "")
                    + "; versions 1, 2, 5 and netCDF-4 are read", where, "Convert it, for example with nccopy -k nc4");
        }
        String text = new String(head, StandardCharsets.ISO_8859_1).stripLeading().toLowerCase(Locale.ROOT);
        if (text.startsWith("<!doctype html") || text.startsWith("<html")) {
            return Problem.input("The file is a web page (HTML), perhaps a login or error page saved instead of the data",
                    where, "Fetch the file again, logged in");
        }
        if (text.startsWith("<?xml") || text.startsWith("{")) {
            return Problem.input("The file is text (XML or JSON), perhaps an error message saved instead of the data", where,
                    "Look into the file and fetch it again");
        }
        return Problem.input("The file is neither netCDF nor GeoTIFF: its first bytes are those of no format that is read",
                where, "Give netCDF (classic or netCDF-4) or GeoTIFF files");
    }

    private static boolean begins(byte[] head, int... bytes) {
        if (head.length < bytes.length) {
            return false;
        }
        for (int i = 0; i < bytes.length; i++) {
            if ((head[i] & 0xff) != bytes[i]) {
                return false;
            }
        }
        return true;
    }
}
