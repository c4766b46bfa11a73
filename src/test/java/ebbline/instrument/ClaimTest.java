package ebbline.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import org.junit.jupiter.api.Test;

class ClaimTest {

  @Test
  void flowsMergeInTheOrderOfTime() {
    CashFlows one = CashFlows.of(new double[] {1, 3}, new double[] {10, 30});
    CashFlows other = CashFlows.of(new double[] {0.5, 1, 4}, new double[] {5, 11, 40});
    CashFlows both = one.plus(other);
    assertThat(both.times()).containsExactly(0.5, 1, 1, 3, 4);
    assertThat(both.amounts()).containsExactly(5, 10, 11, 30, 40);
    assertThat(both.times(-2).amounts()).containsExactly(-10, -20, -22, -60, -80);
    assertThat(one.plus(CashFlows.NONE)).isEqualTo(one).hasSameHashCodeAs(one);
  }

  @Test
  void aFlowOnTheMomentIsNotAfterIt() {
    CashFlows flows = CashFlows.of(new double[] {1, 2, 3}, new double[] {1, 2, 3});
    assertThat(flows.after(2).times()).containsExactly(3);
    assertThat(flows.after(2 - 0.5e-9).times()).containsExactly(3);
    assertThat(flows.after(2 - 2e-9).times()).containsExactly(2, 3);
    assertThat(flows.after(9).isEmpty()).isTrue();
  }

  @Test
  void flowsThatMakeNoSenseAreRefused() {
    assertThatThrownBy(() -> CashFlows.of(new double[] {1}, new double[] {1, 2}))
        .hasMessageContaining("found 1 and 2");
    assertThatThrownBy(() -> CashFlows.of(new double[] {2, 1}, new double[] {1, 2}))
        .hasMessageContaining("must not fall");
    assertThatThrownBy(() -> CashFlows.single(1, Double.NaN)).hasMessageContaining("NaN");
    assertThatThrownBy(() -> CashFlows.single(Double.NaN, 1)).hasMessageContaining("NaN");
  }

  @Test
  void rightsThatMakeNoSenseAreRefused() {
    CashFlows cash = CashFlows.single(1, 100);
    assertThatThrownBy(() -> new Right(Right.Party.HOLDER, -1, 1, cash))
        .hasMessageContaining("decision");
    assertThatThrownBy(() -> new Right(Right.Party.HOLDER, 1, 0.5, cash))
        .hasMessageContaining("0.5");
    assertThatThrownBy(() -> new Right(Right.Party.HOLDER, 2, 2, cash))
        .hasMessageContaining("at or after the decision");
    Right late = new Right(Right.Party.ISSUER, 1, 1, cash);
    Right early = new Right(Right.Party.ISSUER, 0.5, 0.5, cash);
    assertThatThrownBy(() -> new Claim(CashFlows.NONE, List.of(late, early), 0, 0))
        .hasMessageContaining("order of their decisions");
    assertThatThrownBy(() -> new Claim(CashFlows.NONE, List.of(), -1, 0))
        .hasMessageContaining("before today");
  }
}
