/**
 * Calendar time: moments, tenors, day counts, holiday calendars, schedules, and the axis that turns
 * dates into years. Holds the report of a bad input too, because every floor may have to make one.
 * Knows no rates and no money.
 *
 * <p>Floor 1 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.time;
