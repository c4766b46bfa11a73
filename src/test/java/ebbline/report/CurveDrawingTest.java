package ebbline.report;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SvenssonCurve;
import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

class CurveDrawingTest {
  private static final DiscountCurve STEPS =
      InterpolatedCurve.ofDiscounts(
          Interpolation.LOG_LINEAR, new double[] {1, 2, 5}, new double[] {0.97, 0.95, 0.85});

  private static Document parsed(String svg) throws Exception {
    return DocumentBuilderFactory.newInstance()
        .newDocumentBuilder()
        .parse(new ByteArrayInputStream(svg.getBytes(StandardCharsets.UTF_8)));
  }

  @Test
  void thePlotFitsATerminalAndHasBothLines() {
    for (DiscountCurve curve :
        List.of(STEPS, FlatCurve.of(-0.005), SvenssonCurve.of(0.04, -0.02, -0.03, 0.02, 1.3, 7))) {
      String plot = CurvePlot.draw(curve, 30);
      assertThat(plot.lines()).hasSize(22).allMatch(line -> line.length() <= 80);
      assertThat(plot).matches("(?s)[\\x20-\\x7e\\n]*"); // plain characters
      assertThat(plot.lines().skip(1).filter(line -> line.contains("*"))).isNotEmpty();
    }
    assertThat(CurvePlot.draw(STEPS, 5).lines().skip(1).filter(l -> l.contains("o")))
        .as("three levels of the forward, the first under the zero rate")
        .hasSize(2);
  }

  @Test
  void zeroHasALineOfItsOwnWhereRatesCrossIt() {
    DiscountCurve crossing = SvenssonCurve.nelsonSiegel(0.02, -0.03, 0, 2);
    assertThat(CurvePlot.draw(crossing, 20).lines().limit(19)).anyMatch(l -> l.contains("-----"));
    assertThat(CurvePlot.draw(STEPS, 5).lines().limit(19)).noneMatch(l -> l.contains("-----"));
  }

  @Test
  void aForwardThatJumpsIsDrawnInPieces() {
    RateLines lines = new RateLines(STEPS, 5);
    assertThat(lines.forwards()).hasSize(3);
    assertThat(lines.forwards().get(0)).allMatch(p -> Math.abs(p.rate() + Math.log(0.97)) < 1e-15);
    DiscountCurve smooth =
        InterpolatedCurve.ofDiscounts(
            Interpolation.CUBIC, new double[] {1, 2, 5}, new double[] {0.97, 0.95, 0.85});
    assertThat(new RateLines(smooth, 5).forwards()).hasSize(1);
    assertThat(new RateLines(STEPS, 1.5).forwards()).hasSize(2);
  }

  @Test
  void ticksAreRoundNumbers() {
    assertThat(RateLines.step(30, 8)).isEqualTo(5);
    assertThat(RateLines.step(0.7, 7)).isEqualTo(0.1);
    assertThat(RateLines.step(1, 8)).isEqualTo(0.1);
    assertThat(RateLines.ticks(-0.35, 0.41, 0.2)).hasSize(4).contains(0.0);
    assertThat(RateLines.decimals(0.05)).isEqualTo(2);
    assertThat(RateLines.decimals(5)).isZero();
    assertThat(RateLines.decimals(0.1)).isEqualTo(1);
  }

  @Test
  void thePictureIsWellFormedAndItsLinesStayInside() throws Exception {
    String svg = CurveSvg.draw(STEPS, 5, List.of(1.0, 2.0, 5.0, 9.0), "Rates <of> \u0007 A & B");
    Document document = parsed(svg);
    assertThat(document.getElementsByTagName("title").item(0).getTextContent())
        .isEqualTo("Rates <of>   A & B");
    NodeList marks = document.getElementsByTagName("circle");
    assertThat(marks.getLength()).as("nodes within the horizon").isEqualTo(3);
    NodeList paths = document.getElementsByTagName("path");
    assertThat(paths.getLength()).as("zero, three of forwards, axes, legend").isEqualTo(7);
    for (int i = 0; i < paths.getLength(); i++) {
      for (String pair : ((Element) paths.item(i)).getAttribute("d").split("[MLVHh]", -1)) {
        String[] xy = pair.split(" ", -1);
        if (xy.length == 2) {
          assertThat(Double.parseDouble(xy[0])).isBetween(0.0, 720.0);
          assertThat(Double.parseDouble(xy[1])).isBetween(0.0, 450.0);
        }
      }
    }
    assertThat(CurveSvg.draw(STEPS, 5, List.of(1.0, 2.0, 5.0, 9.0), "Rates <of> \u0007 A & B"))
        .isEqualTo(svg);
  }
}
