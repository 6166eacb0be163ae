/**
 * <b>Purpose.</b> Daily minima of a climate model's future brought onto the observed grid and freed of the model's bias, as one more
 * {@link org.wintersill.temperature.DailyTemperatureSource}.
 *
 * <p><b>May depend on.</b> {@code grid}, {@code time}, {@code temperature}, {@code elevation}, {@code engine}, {@code problem}.
 *
 * <p><b>Conventions.</b> Three series: <i>observed</i> on its own grid, <i>historical</i> and <i>future</i> of one model on another.
 * Values are pooled by the time of the year, over all years of a series. NaN is missing, and is in no pool. Start reading in
 * {@link org.wintersill.scenario.ScenarioSource}.
 */
package org.wintersill.scenario;
