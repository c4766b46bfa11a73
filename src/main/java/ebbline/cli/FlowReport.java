package ebbline.cli;

import ebbline.instrument.BookRow;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Optionlet;
import ebbline.instrument.Right;
import ebbline.pricing.IntegrationCheck;
import ebbline.pricing.Market;
import ebbline.pricing.Valuation;
import ebbline.report.ResultRow;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** One row's flows with their discount factors: where its value comes from. */
final class FlowReport {
  private FlowReport() {}

  /** Adds the flows, their sum and, for one right, the value by a second method. */
  static void explain(ResultRow.Builder result, BookRow row, Market market) {
    Claim claim = market.claim(row.instrument());
    result.rows("flows", flows(row, market));
    if (claim.rights().size() == 1 && market.rates().isPresent()) {
      Valuation second = IntegrationCheck.value(claim, market.rates().get());
      double scale = row.face() / 100;
      result.put(
          "integration_check",
          new ebbline.report.Cell.Group(
              ResultRow.builder()
                  .number("present_value", second.presentValue() * scale, 10)
                  .magnitude("error_bound", second.errorBound() * Math.abs(scale))
                  .build()));
    }
  }

  /**
   * One result a flow, then their sum. Of an option these are the flows that exercise would bring,
   * discounted as if they were certain.
   */
  static List<ResultRow> flows(BookRow row, Market market) {
    Claim claim = market.claim(row.instrument());
    double scale = row.face() / 100;
    List<ResultRow> rows = new ArrayList<>();
    double sum = add(rows, "flow", claim.flows(), scale, market);
    for (Right right : claim.rights()) {
      String name = "on exercise at " + time(right.decision());
      sum += add(rows, name, right.received(), scale, market);
    }
    for (Optionlet optionlet : claim.optionlets()) {
      String name = "on exercise for the period from " + time(optionlet.start());
      sum += add(rows, name, optionlet.exchanged(), scale, market);
    }
    rows.add(ResultRow.builder().text("flow", "sum").number("present_value", sum, 6).build());
    return rows;
  }

  private static double add(
      List<ResultRow> rows, String name, CashFlows flows, double scale, Market market) {
    double sum = 0;
    for (int i = 0; i < flows.size(); i++) {
      double time = flows.time(i);
      double amount = flows.amount(i) * scale;
      double discount = market.curve().discount(time);
      sum += amount * discount;
      ResultRow.Builder row = ResultRow.builder().text("flow", name);
      market
          .axis()
          .asOf()
          .ifPresent(
              day ->
                  row.text(
                      "date",
                      day.plusDays(Math.round(time / market.axis().years(day.plusDays(1))))
                          .toString()));
      row.number("time", time, 6)
          .number("amount", amount, 6)
          .number("discount", discount, 8)
          .number("present_value", amount * discount, 6);
      rows.add(row.build());
    }
    return sum;
  }

  private static String time(double years) {
    return String.format(Locale.ROOT, "%.6g years", years);
  }
}
