package org.wintersill.run;

import java.nio.file.Path;
import java.util.List;

/**
 * What a finished run made.
 *
 * @param folder where
 * @param files number of files
 * @param areas areas by class, one a cultivar
 */
public record RunReport(Path folder, int files, List<ClassAreas> areas) {
}
