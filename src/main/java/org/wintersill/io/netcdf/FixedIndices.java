package org.wintersill.io.netcdf;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.problem.Problem;

/** Chooses the index along every dimension that is neither time nor horizontal: heights, levels, ensemble members. */
final class FixedIndices {
    private FixedIndices() {
    }

    /**
     * @param kept places of the dimensions of time and of the map
     * @param member number (from 1) or label of the member wanted
     * @return {@code [dimension]}: index, 0 for those that are kept
     */
    static int[] of(CdfHeader header, RawReader reader, CdfVariable variable, List<Integer> kept, Optional<String> member) {
        int[] fixed = new int[variable.rank()];
        boolean memberUsed = false;
        for (int i = 0; i < variable.rank(); i++) {
            String dimension = variable.dimensions().get(i);
            if (kept.contains(i)) {
                continue;
            }
            int length = variable.shape()[i];
            String where = CdfProblems.at(header.path(), variable.name());
            if (AxisRole.of(header, dimension) == AxisRole.MEMBER || member.isPresent() && length > 1) {
                fixed[i] = member(header, reader, dimension, length, member, where);
                memberUsed = true;
            } else if (length != 1) {
                throw Problem.input("The variable has " + length + " entries along '" + dimension
                        + "', which is neither time nor a horizontal axis", where, "Take one of them out first, for example with"
                        + " 'ncks -d " + dimension + ",0'; members of an ensemble are chosen with member").asException();
            }
        }
        if (member.isPresent() && !memberUsed) {
            throw Problem.input("The run file asks for member '" + member.get() + "', but the variable has no members",
                    CdfProblems.at(header.path(), variable.name()), "Leave out member").asException();
        }
        return fixed;
    }

    private static int member(CdfHeader header, RawReader reader, String dimension, int length, Optional<String> wanted,
                              String where) {
        if (wanted.isEmpty() && length == 1) {
            return 0;
        }
        List<String> labels = labels(header, reader, dimension, length);
        if (wanted.isPresent()) {
            int byLabel = labels.indexOf(wanted.get().trim());
            if (wanted.get().trim().matches("\\d{1,6}")) {
                int number = Integer.parseInt(wanted.get().trim());
                if (number >= 1 && number <= length) {
                    return number - 1;
                }
            }
            if (byLabel >= 0) {
                return byLabel;
            }
        }
        String accepted = "1 to " + length + (labels.isEmpty() ? "" : ", or " + String.join(", ", labels.subList(0,
                Math.min(12, labels.size()))));
        throw Problem.input(wanted.map(w -> "There is no member '" + w + "'").orElse("The file has " + length + " members")
                + " along '" + dimension + "'; accepted are " + accepted, where, "Choose one with member").asException();
    }

    /** Labels of the members: a text variable along the dimension, if there is one. */
    private static List<String> labels(CdfHeader header, RawReader reader, String dimension, int length) {
        for (CdfVariable v : header.all()) {
            if (v.rank() < 1 || !v.dimensions().get(0).equals(dimension)) {
                continue;
            }
            if (v.storage() instanceof Storage.Labels labels && labels.texts().size() == length) {
                return labels.texts();
            }
            if (v.type() == RawType.CHAR && v.rank() == 2 && v.size() < 1 << 20) {
                double[] codes = reader.all(v);
                int width = v.shape()[1];
                List<String> texts = new ArrayList<>();
                for (int i = 0; i < length; i++) {
                    StringBuilder text = new StringBuilder();
                    for (int k = 0; k < width && codes[i * width + k] != 0; k++) {
                        text.append((char) codes[i * width + k]);
                    }
                    texts.add(text.toString().trim());
                }
                return texts;
            }
        }
        return List.of();
    }
}
