/**
 * Models and curves from observations: least squares and likelihood, with standard errors. Commons
 * Math's optimisers stay behind this package's types.
 *
 * <p>Floor 5 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.fitting;
