/**
 * The Vasicek model from a panel of yields: historical and pricing measure together, by maximum
 * likelihood with a Kalman filter over the short rate that nobody observes.
 *
 * <p>Floor 5 of the house, part of {@code fitting}; see {@code docs/floors.puml}.
 */
package ebbline.fitting.panel;
