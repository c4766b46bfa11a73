package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SvenssonCurve;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.InputProblems;
import ebbline.time.TimeAxis;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ModelFileTest {
  private static final TimeAxis TODAY = TimeAxis.from(LocalDate.of(2026, 11, 30));
  private static final String VASICEK =
      """
      {
        "format" : "ebbline-model/1",
        "model" : "vasicek",
        "measure" : "risk-neutral",
        "as_of" : "2026-11-30",
        "mean_reversion" : 0.1,
        "volatility" : 0.015,
        "short_rate" : 0.05,
        "long_run_mean" : 0.08
      }
      """;

  @TempDir private Path folder;

  private ModelInput saved(ModelInput model) {
    Path file = folder.resolve("model.json");
    ModelWriter.write(file, model);
    return ModelFile.read(file.toString());
  }

  private String message(String text) throws IOException {
    Path file = folder.resolve("m.json");
    Files.writeString(file, text);
    try {
      ModelFile.read(file.toString());
    } catch (InputProblems e) {
      return e.getMessage().replace(file.toString(), "F");
    }
    throw new AssertionError("the file was accepted");
  }

  @Test
  void vasicekComesBackToTheLastBit() {
    Vasicek model = new Vasicek(1 / 3.0, -0.1 / 7, 0.1 + 0.2, 1e-300);
    ModelInput read = saved(ModelInput.of(model, TODAY, Optional.empty()));
    assertThat(read.vasicek()).contains(model);
    assertThat(read.axis().asOf()).contains(LocalDate.of(2026, 11, 30));
    assertThat(read.measure()).isEqualTo(ModelInput.Measure.RISK_NEUTRAL);
    assertThat(saved(ModelInput.of(model, TimeAxis.undated(), Optional.empty())).axis().asOf())
        .isEmpty();
  }

  @Test
  void hullWhiteComesBackWithItsCurveToTheLastBit() {
    Random random = new Random(3);
    for (int i = 0; i < 60; i++) {
      Interpolation interpolation =
          List.of(
                  Interpolation.LOG_LINEAR,
                  Interpolation.LINEAR_ZERO,
                  Interpolation.CUBIC,
                  Interpolation.MONOTONE_CONVEX)
              .get(i % 4);
      int n = 1 + random.nextInt(12);
      double[] times = new double[n];
      double[] logs = new double[n];
      double t = 0;
      double scale = Math.pow(10, -random.nextInt(16));
      for (int k = 0; k < n; k++) {
        t += 1e-3 + 5 * random.nextDouble();
        times[k] = t;
        logs[k] = -scale * t * (0.05 * random.nextDouble() - 0.01);
      }
      InterpolatedCurve curve = InterpolatedCurve.of(interpolation, times, logs);
      VolatilitySteps steps =
          VolatilitySteps.of(new double[] {1 / 3.0, 2}, new double[] {0.01, 0.1 / 7, 0});
      HullWhite model = new HullWhite(-0.01 / 3, steps);
      ModelInput read = saved(ModelInput.of(model, curve, TODAY, Optional.empty()));
      assertThat(read.hullWhite()).contains(model);
      InterpolatedCurve back = (InterpolatedCurve) read.curve().orElseThrow();
      assertThat(back.interpolation()).isEqualTo(interpolation);
      assertThat(back.nodes()).containsExactly(times);
      assertThat(back.nodeLogDiscounts()).containsExactly(logs);
    }
  }

  @Test
  void formulaeAndFlatCurvesComeBack() {
    HullWhite model = new HullWhite(0.05, VolatilitySteps.constant(0.01));
    DiscountCurve svensson = SvenssonCurve.of(0.04, -0.01 / 3, 0.02, 0.01, 1.7, 9.1);
    DiscountCurve read =
        saved(ModelInput.of(model, svensson, TODAY, Optional.empty())).curve().orElseThrow();
    assertThat(((SvenssonCurve) read).betas()).containsExactly(0.04, -0.01 / 3, 0.02, 0.01);
    assertThat(((SvenssonCurve) read).taus()).containsExactly(1.7, 9.1);
    TimeAxis act360 = TimeAxis.from(LocalDate.of(2026, 11, 30), TimeAxis.TimeBasis.ACT_360);
    ModelInput flat = saved(ModelInput.of(model, FlatCurve.of(0.1 / 3), act360, Optional.empty()));
    assertThat(((FlatCurve) flat.curve().orElseThrow()).rate()).isEqualTo(0.1 / 3);
    assertThat(flat.axis().basis()).isEqualTo(TimeAxis.TimeBasis.ACT_360);
  }

  @Test
  void theFitComesBack() {
    FitSummary fit =
        new FitSummary(
            "least squares",
            1e-4,
            12,
            true,
            Map.of("short_rate", 1e-5),
            List.of(List.of(1e-10)),
            List.of(new FitSummary.Quote("1Y", 0.04, 0.041, 0.001)));
    Vasicek model = new Vasicek(0.05, 0.05, 0.1, 0.01);
    assertThat(saved(ModelInput.of(model, TODAY, Optional.of(fit))).fit()).contains(fit);
  }

  @Test
  void aFileCutAnywhereIsAPlacedProblem() throws IOException {
    String whole = VASICEK.strip();
    Path file = folder.resolve("cut.json");
    for (int length = 1; length < whole.length(); length++) {
      Files.writeString(file, whole.substring(0, length));
      assertThatThrownBy(() -> ModelFile.read(file.toString()))
          .as("cut at " + length)
          .isInstanceOf(InputProblems.class)
          .hasMessageMatching("(?s).*cut\\.json:\\d+:\\d+: .*");
    }
  }

  @Test
  void whatIsWrongIsSaidWithLineAndColumn() throws IOException {
    assertThat(message(VASICEK.replace("\"volatility\"", "\"volatillity\"")))
        .isEqualTo(
            "F:7:19: found '0.015': member 'volatillity': there is no such member; did you mean"
                + " 'volatility'?");
    assertThat(message(VASICEK.replace("  \"short_rate\" : 0.05,\n", "")))
        .isEqualTo("F:1:1: the member 'short_rate' is missing");
    assertThat(message(VASICEK.replace("0.015", "-0.015")))
        .isEqualTo(
            "F:7:18: found '-0.015': member 'volatility': volatility must be at least 0, found"
                + " -0.015");
    assertThat(message(VASICEK.replace("0.015", "\"1.5%\"")))
        .isEqualTo("F:7:18: found '1.5%': member 'volatility': expected a number");
    assertThat(message(VASICEK.replace("0.015", "NaN"))).contains("F:7:").contains("no valid JSON");
    assertThat(message(VASICEK.replace("0.1,", "1e999,"))).contains("expected a finite number");
    assertThat(message(VASICEK.replace("model/1", "model/9")))
        .contains("found 'ebbline-model/9': member 'format': expected 'ebbline-model/1'");
    assertThat(message(VASICEK.replace("vasicek", "cir")))
        .contains("expected vasicek or hull-white");
    assertThat(message(VASICEK.replace("risk-neutral", "real"))).contains("or historical");
    assertThat(message(VASICEK.replace("2026-11-30", "2026-02-30"))).contains("no such day");
    assertThat(
            message(
                VASICEK.replace(
                    "  \"model\" : \"vasicek\",\n", "  \"model\" : 1,\n  \"model\" : 2,\n")))
        .contains("F:4:");
    assertThat(message(VASICEK.strip() + " x")).contains("F:");
    assertThat(message("[]")).isEqualTo("F:1:1: expected an object");
    assertThat(message(VASICEK.replace("vasicek", "hull-white")))
        .isEqualTo("F:1:1: the member 'curve' is missing");
  }

  @Test
  void curvesInsideAreCheckedNodeByNode() throws IOException {
    String model =
        """
        {
          "format" : "ebbline-model/1",
          "model" : "hull-white",
          "measure" : "risk-neutral",
          "mean_reversion" : 0.1,
          "volatility" : [ { "until" : 1, "value" : 0.01 }, { "value" : 0.02 } ],
          "curve" : { "interpolation" : "cubic", "nodes" : [
            { "time" : 1, "discount" : 0.96 },
            { "time" : 2, "discount" : 0.92 } ] }
        }
        """;
    Path file = folder.resolve("ok.json");
    Files.writeString(file, model);
    assertThat(ModelFile.read(file.toString()).hullWhite().orElseThrow().volatility().count())
        .isEqualTo(2);
    assertThat(message(model.replace("\"time\" : 2", "\"time\" : 1")))
        .contains("F:9:")
        .contains("times must be positive and increase");
    assertThat(message(model.replace("0.92", "0"))).contains("a discount factor must be above 0");
    assertThat(message(model.replace("cubic", "curly"))).contains("expected an interpolation");
    assertThat(message(model.replace("\"until\" : 1,", ""))).contains("'until' is missing");
    assertThat(
            message(model.replace("{ \"value\" : 0.02 }", "{ \"until\" : 3, \"value\" : 0.02 }")))
        .contains("the last step has no end");
    assertThat(
            message(
                model.replace(
                    "\"mean_reversion\" : 0.1", "\"mean_reversion\" : 0.1, \"short_rate\" : 1")))
        .contains("a Hull-White model has no such parameter");
  }
}
