package org.wintersill.engine;

import org.wintersill.season.WinterValues;

/** Takes the finished winters of lanes; called by several workers at once, each lane and winter exactly once. */
public interface WinterSink {

    /**
     * @param season number of the winter
     * @param firstRow first target row of the lane
     * @param values the lane's values, row by row
     */
    void accept(int season, int firstRow, WinterValues values);
}
