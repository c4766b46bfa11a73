/**
 * Claims to valuations: discounting, closed forms, numerical methods, each with its error bound.
 * Reads no file and prints nothing.
 *
 * <p>Floor 4 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.pricing;
