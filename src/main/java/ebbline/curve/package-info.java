/**
 * Discount curves and their interpolations: discount factors, zero and forward rates, and the
 * sensitivities of log discounts to the nodes. Knows no instrument and no date.
 *
 * <p>Floor 2 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.curve;
