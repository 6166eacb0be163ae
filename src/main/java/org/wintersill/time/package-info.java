/**
 * <b>Purpose.</b> Calendars of the CF conventions, day axes with gaps, and winters that cross the new year.
 *
 * <p><b>May depend on.</b> {@code problem}.
 *
 * <p><b>Conventions.</b> A day is a whole number: days since 1970-01-01 of the same calendar. A date is only
 * meaningful with its calendar, so {@link org.wintersill.time.CfCalendar} makes and reads dates.
 * {@code java.time} is not used here: it has no 30 February. Source: CF conventions 1.8, section 4.4.1.
 */
package org.wintersill.time;
