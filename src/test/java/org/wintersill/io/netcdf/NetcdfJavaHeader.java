package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import ucar.ma2.Array;
import ucar.ma2.DataType;
import ucar.ma2.InvalidRangeException;
import ucar.nc2.Attribute;
import ucar.nc2.Dimension;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;

/** Headers as NetCDF-Java understands them: a second opinion for tests. */
final class NetcdfJavaHeader {

    static {
        // without this NetCDF-Java reads wrong values from classic files that were cut short
        System.setProperty("ucar.nc2.iosp.netcdf3.N3header.disallowFileTruncation", "true");
    }

    private NetcdfJavaHeader() {
    }

    /** Opens a file without interpreting it. */
    static NetcdfFile open(Path path) throws IOException {
        return NetcdfFile.open(path.toString());
    }

    static CdfHeader read(Path path, long fileSize) throws IOException {
        try (NetcdfFile file = open(path)) {
            Map<String, CdfVariable> variables = new LinkedHashMap<>();
            for (Variable variable : file.getRootGroup().getVariables()) {
                variables.put(variable.getShortName(), describe(variable));
            }
            return new CdfHeader(path, "netCDF-4/HDF5", fileSize, variables);
        }
    }

    private static CdfVariable describe(Variable variable) {
        List<String> dimensions = new ArrayList<>();
        for (Dimension dimension : variable.getDimensions()) {
            dimensions.add(dimension.getShortName() == null ? variable.getShortName() + "#" + dimensions.size()
                    : dimension.getShortName());
        }
        Map<String, Object> attributes = new LinkedHashMap<>();
        for (Attribute attribute : variable.getAttributes()) {
            if (attribute.isString()) {
                attributes.put(attribute.getShortName(), String.valueOf(attribute.getStringValue()));
            } else if (attribute.getLength() > 0 && attribute.getValues() != null) {
                double[] values = new double[attribute.getLength()];
                for (int i = 0; i < values.length; i++) {
                    values[i] = attribute.getNumericValue(i).doubleValue();
                }
                attributes.put(attribute.getShortName(),
                        new CdfVariable.Numbers(type(attribute.getDataType(), attribute.isUnsigned()), values));
            }
        }
        RawType type = type(variable.getDataType(), variable.isUnsigned());
        Storage storage = type.isNumeric() ? new Storage.Unreadable("read by NetCDF-Java")
                : new Storage.Unreadable("its values are no plain numbers");
        return new CdfVariable(variable.getShortName(), type, true, List.copyOf(dimensions), variable.getShape(), attributes,
                storage);
    }

    private static RawType type(DataType type, boolean unsigned) {
        RawType signed = switch (type) {
            case BYTE -> RawType.BYTE;
            case SHORT -> RawType.SHORT;
            case INT -> RawType.INT;
            case LONG -> RawType.LONG;
            case FLOAT -> RawType.FLOAT;
            case DOUBLE -> RawType.DOUBLE;
            case CHAR -> RawType.CHAR;
            default -> RawType.OTHER;
        };
        return unsigned ? signed.unsigned() : signed;
    }

    /** A box of values, in the order of the file. */
    static double[] box(NetcdfFile file, Path path, CdfVariable variable, int[] origin, int[] shape) {
        try {
            return numbers(find(file, path, variable).read(origin, shape), variable);
        } catch (IOException | InvalidRangeException | RuntimeException e) {
            throw CdfProblems.damaged(path, "variable '" + variable.name() + "' cannot be decoded", e);
        }
    }

    private static Variable find(NetcdfFile file, Path path, CdfVariable variable) {
        Variable found = file.findVariable(file.getRootGroup(), variable.name());
        if (found == null) {
            throw CdfProblems.changed(path);
        }
        return found;
    }

    private static double[] numbers(Array array, CdfVariable variable) {
        RawType type = variable.saysUnsigned() ? variable.type().unsigned() : variable.type();
        double[] values = new double[(int) array.getSize()];
        for (int i = 0; i < values.length; i++) {
            double value = array.getDouble(i);
            values[i] = type.isInteger() && type.unsigned() == type ? type.cast(value) : value;
        }
        return values;
    }
}
