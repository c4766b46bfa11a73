package ebbline.data;

import ebbline.fitting.panel.YieldPanel;
import java.time.LocalDate;
import java.util.List;

/**
 * A panel of yields.
 *
 * @param panel continuously compounded yields, in decimals, by time and maturity
 * @param labels the maturities as the file heads them
 * @param dates of the rows; empty where the file has none
 * @param file where they came from
 */
public record PanelInput(
    YieldPanel panel, List<String> labels, List<LocalDate> dates, SourceFile file) {

  public PanelInput {
    labels = List.copyOf(labels);
    dates = List.copyOf(dates);
  }
}
