package ebbline.pricing;

import java.util.EnumMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of a book with the figures that mean something for it, or with the reason why it has none.
 */
public final class PricedRow {
  private final String id;
  private final String instrument;
  private final Method method;
  private final Map<PriceFigure, Double> figures;
  private final String message;
  private final boolean failed;

  private PricedRow(
      String id,
      String instrument,
      Method method,
      Map<PriceFigure, Double> figures,
      String message,
      boolean failed) {
    this.id = Objects.requireNonNull(id, "id");
    this.instrument = Objects.requireNonNull(instrument, "instrument");
    this.method = method;
    this.figures = figures;
    this.message = Objects.requireNonNull(message, "message");
    this.failed = failed;
  }

  /**
   * @param message remarks, empty where there are none
   */
  static PricedRow of(
      String id,
      String instrument,
      Method method,
      EnumMap<PriceFigure, Double> figures,
      String message) {
    return new PricedRow(
        id, instrument, Objects.requireNonNull(method), new EnumMap<>(figures), message, false);
  }

  /** A row that could not be priced. */
  public static PricedRow failed(String id, String instrument, String message) {
    return new PricedRow(id, instrument, null, new EnumMap<>(PriceFigure.class), message, true);
  }

  public String id() {
    return id;
  }

  public String instrument() {
    return instrument;
  }

  /** Empty for a row that failed. */
  public Optional<Method> method() {
    return Optional.ofNullable(method);
  }

  public OptionalDouble figure(PriceFigure figure) {
    Double value = figures.get(figure);
    return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
  }

  public boolean hasFailed() {
    return failed;
  }

  public String message() {
    return message;
  }
}
