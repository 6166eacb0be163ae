package org.wintersill.config;

import java.util.List;
import java.util.Optional;
import org.wintersill.time.CfDate;

/**
 * A climate model's future in place of the observed minima.
 *
 * @param method how the change is laid on the observations, a word of {@code scenario.ScenarioMethod}
 * @param pool which days are pooled, a word of {@code scenario.YearPools}
 * @param regrid how the model comes to the observed grid
 * @param historical the model's past
 * @param future the model's future
 * @param reference days of the observations and of the model's past that are compared
 * @param period days of the model's future that are used
 * @param members ids of the members found by the placeholder of the file names; empty where there is none
 * @param member the member that this configuration stands for; empty where there are none, or nobody has chosen yet
 */
public record ScenarioConfig(String method, String pool, String regrid, TemperatureEntry historical, TemperatureEntry future,
                             Optional<Period> reference, Optional<Period> period, List<String> members, Optional<String> member) {

    public ScenarioConfig {
        members = List.copyOf(members);
    }

    /** A run of days, both ends included. */
    public record Period(CfDate from, CfDate to) {
        /** @throws IllegalArgumentException for a text that is none */
        static Period parse(String text) {
            String[] ends = text.split("\\.\\.", -1);
            if (ends.length != 2) {
                throw new IllegalArgumentException(text);
            }
            Period period = new Period(TemperatureSection.date(ends[0]), TemperatureSection.date(ends[1]));
            if (period.from.compareTo(period.to) > 0) {
                throw new IllegalArgumentException(text);
            }
            return period;
        }

        public boolean holds(CfDate date) {
            return from.compareTo(date) <= 0 && date.compareTo(to) <= 0;
        }

        @Override
        public String toString() {
            return from + ".." + to;
        }
    }

    /** Whether every member has to be run by itself. */
    public boolean hasOpenMembers() {
        return member.isEmpty() && !members.isEmpty();
    }
}
