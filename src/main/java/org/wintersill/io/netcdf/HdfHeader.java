package org.wintersill.io.netcdf;

import io.jhdf.AbstractNode;
import io.jhdf.HdfFile;
import io.jhdf.ObjectHeader;
import io.jhdf.api.Attribute;
import io.jhdf.api.Dataset;
import io.jhdf.api.Node;
import io.jhdf.object.datatype.DataType;
import io.jhdf.object.datatype.FixedPoint;
import io.jhdf.object.datatype.FloatingPoint;
import java.io.IOException;
import java.lang.reflect.Array;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.wintersill.problem.ProblemException;

/**
 * Reads the metadata of netCDF-4 files, which are HDF5 files with dimension scales. Links that lead out of the file are
 * not followed.
 *
 * <p>Source: netCDF-4 file format ("NetCDF-4 Format", Unidata) for names of dimensions: attribute DIMENSION_LIST points to
 * the dataset of each dimension; a coordinate variable is its own dimension.
 */
final class HdfHeader {
    /** Attributes by which the netCDF library keeps its books; of no interest and sometimes long. */
    private static final Set<String> INTERNAL = Set.of("REFERENCE_LIST", "CLASS", "NAME", "DIMENSION_LIST",
            "_Netcdf4Dimid", "_Netcdf4Coordinates", "_nc3_strict");
    private static final String PURE_DIMENSION = "This is a netCDF dimension but not a netCDF variable";
    private static final String NON_COORDINATE = "_nc4_non_coord_";
    private static final long ATTRIBUTE_LIMIT = 16 << 20;
    static final String UNDECODED = "its description in the file cannot be decoded";
    private static final long LABEL_LIMIT = 64 << 10;

    private final HdfFile file;
    private final Path path;
    private final long fileSize;
    private final Map<Long, String> dimensionNames = new LinkedHashMap<>();

    private HdfHeader(HdfFile file, Path path, long fileSize) {
        this.file = file;
        this.path = path;
        this.fileSize = fileSize;
    }

    /** @throws RuntimeException of jHDF's where it does not understand the file */
    static CdfHeader read(Path path, long fileSize) throws IOException {
        // the channel is ours so that it is closed even where jHDF gives up half way; there is nothing else to close, and
        // HdfFile.close() of 0.13 fails for a file that it did not open itself
        try (FileChannel channel = new BoundedChannel(path)) {
            HdfFile file = new HdfFile(channel);
            long promised = file.getHdfBackingStorage().getSuperblock().getEndOfFileAddress();
            if (promised > fileSize) {
                throw CdfProblems.truncated(path, promised, fileSize);
            }
            return new HdfHeader(file, path, fileSize).header();
        }
    }

    private CdfHeader header() {
        List<Dataset> datasets = new ArrayList<>();
        for (Node node : file.getChildren().values()) {
            if (!node.isLink() && node instanceof Dataset dataset) {
                datasets.add(dataset);
                dimensionNames.put(dataset.getAddress(), plainName(dataset.getName()));
            }
        }
        Map<String, CdfVariable> variables = new LinkedHashMap<>();
        for (Dataset dataset : datasets) {
            CdfVariable variable = described(dataset);
            if (variable != null) {
                variables.put(variable.name(), variable);
            }
        }
        int version = file.getHdfBackingStorage().getSuperblock().getVersionOfSuperblock();
        return new CdfHeader(path, "netCDF-4/HDF5 (superblock " + version + ")", fileSize, variables);
    }

    private static String plainName(String name) {
        return name.startsWith(NON_COORDINATE) ? name.substring(NON_COORDINATE.length()) : name;
    }

    private static boolean isPureDimension(Dataset dataset) {
        Attribute name = attribute(dataset, "NAME");
        return name != null && name.getData() instanceof String text && text.startsWith(PURE_DIMENSION);
    }

    private static Attribute attribute(Dataset dataset, String name) {
        return dataset.getAttributes().get(name);
    }

    /** The variable, or null for a mere dimension. One that jHDF cannot describe must not make the others unreadable. */
    private CdfVariable described(Dataset dataset) {
        try {
            return isPureDimension(dataset) ? null : variable(dataset);
        } catch (ProblemException e) {
            throw e;
        } catch (RuntimeException e) {
            return new CdfVariable(plainName(dataset.getName()), RawType.OTHER, true, List.of(), new int[0], Map.of(),
                    new Storage.Unreadable(UNDECODED));
        }
    }

    private CdfVariable variable(Dataset dataset) {
        DataType dataType = dataset.getDataType();
        RawType type = rawType(dataType);
        int[] shape = dataset.getDimensions();
        Map<String, Object> attributes = new LinkedHashMap<>();
        for (Map.Entry<String, Attribute> entry : dataset.getAttributes().entrySet()) {
            if (!INTERNAL.contains(entry.getKey())) {
                Object value = value(entry.getValue());
                if (value != null) {
                    attributes.put(entry.getKey(), value);
                }
            }
        }
        ObjectHeader header = ((AbstractNode) dataset).getHeader();
        Storage storage = type.isNumeric() ? new HdfStorage(file, path, fileSize).of(dataset, header, shape, type)
                : labels(dataset, shape);
        return new CdfVariable(plainName(dataset.getName()), type, isLittleEndian(dataType), dimensions(dataset, shape.length),
                shape, attributes, storage);
    }

    /** Texts of a short text variable; anything else that is no number is not read. */
    private Storage labels(Dataset dataset, int[] shape) {
        boolean few = shape.length >= 1 && shape.length <= 2 && dataset.getSizeInBytes() <= Math.min(LABEL_LIMIT, fileSize);
        if (few && dataset.getJavaType() == String.class) {
            try {
                List<String> texts = new ArrayList<>();
                for (Object row : (Object[]) dataset.getData()) {
                    texts.add(row instanceof Object[] letters ? join(letters) : String.valueOf(row).trim());
                }
                return new Storage.Labels(List.copyOf(texts));
            } catch (RuntimeException e) {
                return new Storage.Unreadable("its texts cannot be decoded");
            }
        }
        return new Storage.Unreadable("its values are no plain numbers");
    }

    private static String join(Object[] letters) {
        StringBuilder text = new StringBuilder();
        for (Object letter : letters) {
            text.append(letter);
        }
        return text.toString().replace("\0", "").trim();
    }

    private List<String> dimensions(Dataset dataset, int rank) {
        List<String> names = new ArrayList<>();
        Attribute list = attribute(dataset, "DIMENSION_LIST");
        Object data = list == null ? null : list.getData();
        for (int i = 0; i < rank; i++) {
            String name = null;
            if (data instanceof Object[] references && references.length == rank) {
                name = dimensionNames.get(firstAddress(references[i]));
            } else if (rank == 1 && attribute(dataset, "CLASS") != null) {
                name = plainName(dataset.getName());
            }
            // HDF5 without dimension scales: nothing can be known of this dimension but its place
            names.add(name == null ? dataset.getName() + "#" + i : name);
        }
        return List.copyOf(names);
    }

    private static Long firstAddress(Object reference) {
        if (reference instanceof Number number) {
            return number.longValue();
        }
        return reference != null && reference.getClass().isArray() && Array.getLength(reference) > 0
                && Array.get(reference, 0) instanceof Number number ? Long.valueOf(number.longValue()) : Long.valueOf(-1);
    }

    private static boolean isLittleEndian(DataType type) {
        return !(type instanceof FixedPoint f && f.getByteOrder() == ByteOrder.BIG_ENDIAN)
                && !(type instanceof FloatingPoint g && g.getByteOrder() == ByteOrder.BIG_ENDIAN);
    }

    static RawType rawType(DataType type) {
        if (type instanceof FixedPoint number && number.getBitPrecision() == number.getSize() * 8) {
            RawType signed = switch (number.getSize()) {
                case 1 -> RawType.BYTE;
                case 2 -> RawType.SHORT;
                case 4 -> RawType.INT;
                case 8 -> RawType.LONG;
                default -> RawType.OTHER;
            };
            return number.isSigned() ? signed : signed.unsigned();
        }
        if (type instanceof FloatingPoint number) {
            return number.getSize() == 4 ? RawType.FLOAT : number.getSize() == 8 ? RawType.DOUBLE : RawType.OTHER;
        }
        return RawType.OTHER;
    }

    /** String, Numbers, or null for what we have no use for. */
    private Object value(Attribute attribute) {
        if (attribute.getSizeInBytes() > Math.min(ATTRIBUTE_LIMIT, fileSize) || attribute.isEmpty()) {
            return null;
        }
        RawType type = rawType(attribute.getDataType());
        Object data;
        try {
            data = attribute.getData();
        } catch (RuntimeException e) {
            // one attribute of a kind that jHDF does not know must not make the whole file unreadable
            return null;
        }
        if (data instanceof String text) {
            return text;
        }
        if (data instanceof String[] texts) {
            return String.join(" ", Arrays.stream(texts).filter(t -> t != null).toList());
        }
        if (data == null || !type.isNumeric()) {
            return null;
        }
        if (data instanceof Number number) {
            return new CdfVariable.Numbers(type, new double[] {number.doubleValue()});
        }
        if (!data.getClass().isArray() || data instanceof Object[]) {
            return null;
        }
        double[] values = new double[Array.getLength(data)];
        for (int i = 0; i < values.length; i++) {
            values[i] = ((Number) Array.get(data, i)).doubleValue();
        }
        return new CdfVariable.Numbers(type, values);
    }
}
