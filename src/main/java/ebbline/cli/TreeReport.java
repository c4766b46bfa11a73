package ebbline.cli;

import ebbline.instrument.BookRow;
import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;
import ebbline.pricing.Market;
import ebbline.pricing.TrinomialPricing;
import ebbline.pricing.TrinomialTree;
import ebbline.report.OutputFormat;
import ebbline.report.ResultRow;
import java.util.ArrayList;
import java.util.List;

/** The nodes of the tree that priced a row: shift, rate, probabilities and Arrow–Debreu price. */
final class TreeReport {
  /** Nodes of the first six steps, which still fit a screen. */
  private static final int ON_SCREEN = 36;

  private static final int IN_A_FILE = 100_000;

  private TreeReport() {}

  /** Adds the nodes of whole steps from today on, as many as the format has room for. */
  static void explain(
      ResultRow.Builder result, BookRow row, Market market, int steps, OutputFormat format) {
    Claim claim = market.claim(row.instrument());
    if (claim.rights().isEmpty() || market.rates().isEmpty()) {
      return;
    }
    GaussianRates rates = market.rates().get();
    TrinomialPricing.tree(claim, rates, steps)
        .ifPresent(
            tree ->
                result.rows(
                    "tree", nodes(tree, format == OutputFormat.JSON ? IN_A_FILE : ON_SCREEN)));
  }

  private static List<ResultRow> nodes(TrinomialTree tree, int most) {
    List<ResultRow> rows = new ArrayList<>();
    for (int i = 0; i <= tree.steps() && rows.size() + 2 * tree.reach(i) + 1 <= most; i++) {
      for (int j = tree.reach(i); j >= -tree.reach(i); j--) {
        ResultRow.Builder node =
            ResultRow.builder()
                .count("step", i)
                .number("time", i * tree.stepLength(), 6)
                .number("alpha", tree.alpha(i), 8)
                .count("node", j)
                .number("rate", tree.rate(i, j), 8)
                .number("arrow_debreu", tree.arrowDebreu(i, j), 8);
        if (i < tree.steps()) {
          node.count("middle_leads_to", tree.target(j))
              .number("up", tree.up(j), 6)
              .number("middle", tree.middle(j), 6)
              .number("down", tree.down(j), 6);
        }
        rows.add(node.build());
      }
    }
    return rows;
  }
}
