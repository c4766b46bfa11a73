package ebbline.check;

import ebbline.bond.IndexRatio;
import java.util.Map;
import java.util.Optional;

/** Examples of 31 CFR 356, Appendix B, sections I.B and V: index ratios and interest strips. */
final class IndexedCases implements BondCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    return switch (c.id()) {
      case "CFR-I-B3-refcpi", "CFR-I-B3-refcpi16" -> {
        CaseInputs months = all.get("CFR-I-B3-refcpi");
        double index =
            IndexRatio.reference(
                months.number("ref_1Apr"),
                months.number("ref_1May"),
                in.integer("t"),
                in.integer("D"));
        yield Optional.of(CaseResult.of(c, "reference index of a day", index));
      }
      case "CFR-I-B3-ratio" ->
          Optional.of(
              CaseResult.of(c, "index ratio", IndexRatio.of(in.number("num"), in.number("den"))));
      case "CFR-I-B5-interest" -> {
        double ratio = IndexRatio.of(in.number("ref"), in.number("ref0"));
        double interest =
            IndexRatio.interest(in.number("par"), in.number("coupon_pct") / 100, ratio);
        yield Optional.of(CaseResult.of(c, "half-year's interest on indexed face", interest));
      }
      case "CFR-V-AV" ->
          Optional.of(
              CaseResult.of(
                  c,
                  "adjusted value of an interest strip",
                  IndexRatio.adjustedValue(
                      in.number("par"), in.number("c"), in.number("refcpi0"))));
      case "CFR-V-PA" ->
          Optional.of(
              CaseResult.of(
                  c,
                  "payment of an interest strip",
                  IndexRatio.payment(in.number("AV"), in.number("refcpi"))));
      default -> Optional.empty();
    };
  }
}
