/**
 * <b>Purpose.</b> Composition: from a checked configuration to a plan, to execution, to finished outputs and their record. Also
 * the answers to "how was my file understood" and "what happened in this cell".
 *
 * <p><b>May depend on.</b> Everything but {@code cli}.
 *
 * <p><b>Conventions.</b> {@link org.wintersill.run.RunPlanner} opens everything and refuses early;
 * {@link org.wintersill.run.MapRun} writes into a hidden folder and moves files to their names at the end, the record last. The
 * lists of formats are {@link org.wintersill.run.InputFormats}. Outputs contain no clock, user, host or absolute path.
 */
package org.wintersill.run;
