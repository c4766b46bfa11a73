/**
 * Published worked examples and their verdicts, and one book priced by every method that can.
 *
 * <p>Floor 6 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.check;
