/**
 * Bond arithmetic that needs no model: accrued interest, price and yield, durations, convexity,
 * spreads.
 *
 * <p>Floor 3 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.bond;
