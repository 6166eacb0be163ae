/**
 * <b>Purpose.</b> Cultivar files looked at by themselves: tables, documents and pictures of their curves, driven by a temperature
 * series where they follow the weather, and trial fits to measured lethal temperatures.
 *
 * <p><b>May depend on.</b> What {@code run} may.
 *
 * <p><b>Conventions.</b> Texts are results for standard output; nothing is printed here. Every text and picture carries
 * {@link org.wintersill.run.Caution}. Start reading in {@link org.wintersill.run.curve.CultivarCurve}.
 */
package org.wintersill.run.curve;
