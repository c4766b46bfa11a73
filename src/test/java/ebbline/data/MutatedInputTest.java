package ebbline.data;

import static org.assertj.core.api.Assertions.fail;

import ebbline.pricing.Market;
import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every damaged file gives an answer or a placed problem, and never anything else. */
class MutatedInputTest {
  private static final int MUTATIONS = Integer.getInteger("mutations", 4_000);

  @TempDir private Path folder;

  /** Reads a file. */
  private interface Reader {
    void read(String path);
  }

  private static byte[] mutated(byte[] original, Random random) {
    byte[] bytes = original.clone();
    int times = 1 + random.nextInt(4);
    for (int i = 0; i < times && bytes.length > 2; i++) {
      int at = random.nextInt(bytes.length);
      int end = Math.min(bytes.length, at + 1 + random.nextInt(12));
      switch (random.nextInt(6)) {
        case 0 -> bytes[at] ^= (byte) (1 << random.nextInt(8));
        case 1 -> bytes[at] = (byte) "\",\n\r#:{}[]%-.eE0 x".charAt(random.nextInt(18));
        case 2 -> bytes = Arrays.copyOf(bytes, at + 1);
        case 3 -> bytes = joined(bytes, at, end, bytes, at);
        case 4 -> bytes = joined(bytes, end, end, bytes, at);
        default -> {
          int other = random.nextInt(bytes.length);
          bytes = joined(bytes, Math.max(at, other), bytes.length, bytes, Math.min(at, other));
        }
      }
    }
    return bytes;
  }

  /** The first {@code keep} bytes of one and the bytes from {@code from} of the other. */
  private static byte[] joined(byte[] head, int keep, int unused, byte[] tail, int from) {
    byte[] result = Arrays.copyOf(head, keep + tail.length - from);
    System.arraycopy(tail, from, result, keep, tail.length - from);
    return result;
  }

  private void check(byte[] original, long seed, Reader reader) throws IOException {
    check(original, seed, MUTATIONS, reader);
  }

  private void check(byte[] original, long seed, int mutations, Reader reader) throws IOException {
    Path file = folder.resolve("input");
    Random random = new Random(seed);
    for (int i = 0; i < mutations; i++) {
      byte[] bytes = mutated(original, random);
      Files.write(file, bytes);
      try {
        reader.read(file.toString());
      } catch (InputProblems expected) {
        if (expected.problems().isEmpty() || expected.getMessage().isBlank()) {
          fail("a problem without words");
        }
      } catch (RuntimeException e) {
        fail(
            "seed " + seed + ", mutation " + i + ": " + new String(bytes, StandardCharsets.UTF_8),
            e);
      }
    }
  }

  @Test
  void curveFilesSurvive() throws IOException {
    check(
        Files.readAllBytes(Path.of("curves", "saltmere.csv")),
        1,
        f -> CurveFile.read(f, Optional.empty(), Optional.empty()));
    check(
        Files.readAllBytes(Path.of("curves", "saltmere-svensson.csv")),
        2,
        f -> CurveFile.read(f, Optional.empty(), Optional.empty()));
  }

  @Test
  void quoteSheetsSurvive() throws IOException {
    check(
        Files.readAllBytes(Path.of("curves", "saltmere-quotes.csv")),
        5,
        f -> QuotesFile.read(f, QuoteOverrides.none()));
    check(
        Files.readAllBytes(
            Path.of("src", "test", "resources", "golden", "files", "quotes-years.csv")),
        6,
        f -> QuotesFile.read(f, QuoteOverrides.none()));
  }

  @Test
  void booksSurvive() throws IOException {
    check(
        Files.readAllBytes(Path.of("examples", "book.csv")),
        3,
        f -> BookFile.open(f, CalendarRegistry.standard()).forEach(entry -> {}));
  }

  @Test
  void optionQuotesSurvive() throws IOException {
    CurveInput curve = CurveFile.read("curves/saltmere.csv", Optional.empty(), Optional.empty());
    Market market = Market.of(curve.axis(), curve.curve());
    check(
        Files.readAllBytes(Path.of("examples", "option-quotes.csv")),
        11,
        f -> OptionQuotesFile.read(f, market, CalendarRegistry.standard()));
    check(
        Files.readAllBytes(
            Path.of("src", "test", "resources", "golden", "files", "option-kinds.csv")),
        12,
        f -> OptionQuotesFile.read(f, market, CalendarRegistry.standard()));
  }

  @Test
  void modelFilesSurvive() throws IOException {
    check(
        Files.readAllBytes(Path.of("src", "test", "resources", "golden", "files", "vasicek.json")),
        4,
        ModelFile::read);
  }

  @Test
  void historiesSurvive() throws IOException {
    byte[] dated = Files.readAllBytes(Path.of("examples", "saltmere-rates.csv"));
    check(
        Arrays.copyOf(dated, 900),
        5,
        MUTATIONS / 4,
        f -> HistoryFile.read(f, Optional.empty(), Optional.empty()));
    byte[] bare =
        "# step: 1/250\nrate_pct,other\n3.1,4\n\"\",5\n-0.25,6\n3.4,7\n"
            .getBytes(StandardCharsets.UTF_8);
    check(
        bare,
        6,
        MUTATIONS / 4,
        f -> HistoryFile.read(f, Optional.empty(), Optional.of("rate_pct")));
  }

  @Test
  void panelsSurvive() throws IOException {
    byte[] panel = Files.readAllBytes(Path.of("examples", "saltmere-panel.csv"));
    check(Arrays.copyOf(panel, 1200), 7, MUTATIONS / 4, f -> PanelFile.read(f, Optional.empty()));
  }
}
