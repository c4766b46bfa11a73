/**
 * The historical measure: the Vasicek model from a history of one rate, with standard errors, bias
 * corrections, intervals and diagnostics. Works on arrays of times and rates; reads no file.
 *
 * <p>Floor 5 of the house, part of {@code fitting}; see {@code docs/floors.puml}.
 */
package ebbline.fitting.history;
