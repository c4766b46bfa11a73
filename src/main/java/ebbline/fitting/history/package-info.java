/**
 * The historical measure: the Vasicek model from a history of one rate, with standard errors, bias
 * corrections, intervals and diagnostics. Works on arrays of times and rates; reads no file.
 *
 * <p>The road through it: a {@code RateHistory} and a {@code HistoryMethod} give a {@code
 * HistoryEstimate} from {@code HistoryEstimator}. For a reverting one, a {@code Bootstrap} gives
 * the bootstrap {@code BiasCorrection}, and with it {@code HistoryIntervals} the intervals offered
 * first; {@code Interval.gaussian} stands beside them, {@code Diagnostics} and {@code
 * RollingWindow} say whether the model suits. A {@code Resampling} carries the seed.
 *
 * <p>Floor 5 of the house, part of {@code fitting}; see {@code docs/floors.puml}.
 */
package ebbline.fitting.history;
