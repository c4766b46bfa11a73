package ebbline.instrument;

import java.util.Locale;

/** Whether the holder pays or receives the fixed rate of a swap. */
public enum SwapSide {
  PAYER(-1),
  RECEIVER(1);

  private final int sign;

  SwapSide(int sign) {
    this.sign = sign;
  }

  /** 1 where the fixed rate is received, −1 where it is paid. */
  public int sign() {
    return sign;
  }

  /**
   * @throws IllegalArgumentException for another text than payer or receiver
   */
  public static SwapSide of(String text) {
    String wanted = text.strip().toLowerCase(Locale.ROOT);
    if (wanted.equals("payer")) {
      return PAYER;
    } else if (wanted.equals("receiver")) {
      return RECEIVER;
    }
    throw new IllegalArgumentException("expected payer or receiver");
  }
}
