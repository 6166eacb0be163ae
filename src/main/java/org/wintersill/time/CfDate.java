package org.wintersill.time;

import java.io.Serializable;

/** Year, month (1..12) and day (from 1) in some calendar; 2020-02-30 is possible in a 360-day calendar. */
public record CfDate(int year, int month, int day) implements Comparable<CfDate>, Serializable {

    @Override
    public int compareTo(CfDate other) {
        int byYear = Integer.compare(year, other.year);
        if (byYear != 0) {
            return byYear;
        }
        int byMonth = Integer.compare(month, other.month);
        return byMonth != 0 ? byMonth : Integer.compare(day, other.day);
    }

    /** ISO form, {@code 2003-01-15}; years below 0 carry a sign. */
    @Override
    public String toString() {
        StringBuilder text = new StringBuilder(10);
        if (year < 0) {
            text.append('-');
        }
        String digits = Integer.toString(Math.abs(year));
        text.append("0".repeat(Math.max(0, 4 - digits.length()))).append(digits).append('-');
        text.append(month < 10 ? "0" : "").append(month).append('-').append(day < 10 ? "0" : "").append(day);
        return text.toString();
    }
}
