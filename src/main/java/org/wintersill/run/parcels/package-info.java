/**
 * <b>Purpose.</b> What a finished run says of parcels and zones: reads its layers tile by tile, adds them up for every polygon, compares
 * the cultivars, and writes layers, tables and pages.
 *
 * <p><b>May depend on.</b> All that {@code run} may.
 *
 * <p><b>Conventions.</b> Nothing is folded again: every number comes from the layers and the record of the run. A parcel's value is the mean
 * of its cells, weighted by covered area. NaN is no value. Start reading in {@link org.wintersill.run.parcels.ParcelRun}.
 */
package org.wintersill.run.parcels;
