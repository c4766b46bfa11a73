package ebbline.instrument;

import java.util.Locale;

/** Whether the holder may buy or sell. */
public enum OptionKind {
  CALL(1),
  PUT(-1);

  private final int sign;

  OptionKind(int sign) {
    this.sign = sign;
  }

  /** 1 for a call, −1 for a put. */
  public int sign() {
    return sign;
  }

  public static OptionKind of(String text) {
    String wanted = text.strip().toLowerCase(Locale.ROOT);
    if (wanted.equals("call")) {
      return CALL;
    } else if (wanted.equals("put")) {
      return PUT;
    }
    throw new IllegalArgumentException("expected call or put");
  }
}
