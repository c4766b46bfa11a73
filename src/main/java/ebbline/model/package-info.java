/**
 * The one-factor Gaussian short rate on a discount curve, with Vasicek and Hull-White as two ways
 * to make one, and the standard normal law. Prices no instrument.
 *
 * <p>Floor 3 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.model;
