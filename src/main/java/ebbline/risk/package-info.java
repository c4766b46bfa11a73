/**
 * Sensitivities, scenarios and horizon distributions of a book.
 *
 * <p>Floor 5 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.risk;
