package org.wintersill.hardiness;

import org.wintersill.time.CfDate;

/**
 * Lethal temperatures that were measured in one sample, such as a freezing test.
 *
 * @param cultivar as the table names it
 * @param date of the sample
 * @param lt10 degC; NaN where it was not measured
 * @param lt50 degC
 * @param lt90 degC; NaN where it was not measured
 * @param count organs in the sample; NaN where the table does not tell
 */
public record MeasuredTolerance(String cultivar, CfDate date, double lt10, double lt50, double lt90, double count) {
}
