package ebbline.bench;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.function.DoubleSupplier;

/**
 * Runs one piece of work a line, to be alternated with the same work in another language: {@code
 * run NAME} answers nanoseconds, items and a check sum; {@code dump NAME FILE} writes the first
 * 2000 results; {@code list}; {@code quit}. The argument is the data folder.
 */
public final class Coprocess {
  private record Kernel(DoubleSupplier work, double items, double[] results) {}

  private Coprocess() {}

  public static void main(String[] arguments) throws IOException {
    Workload load = new Workload(Path.of(arguments[0]));
    Map<String, Kernel> kernels = new LinkedHashMap<>();
    kernels.put("pv_walk", new Kernel(load::bondsByWalking, load.bondFlows, load.bondValues));
    kernels.put("pv_day", new Kernel(load::bondsByDay, load.bondFlows, load.bondValues));
    kernels.put("full", new Kernel(load::bondMeasures, load.bondFlows, load.bondYields));
    double zeros = load.zeroValues.length;
    kernels.put("zbo", new Kernel(load::zeroOptionsAlone, zeros, load.zeroValues));
    kernels.put("zbo_blocks", new Kernel(load::zeroOptionsInBlocks, zeros, load.zeroValues));
    double coupons = load.couponValues.length;
    kernels.put("cbo", new Kernel(load::couponOptionsAlone, coupons, load.couponValues));
    kernels.put("cbo_blocks", new Kernel(load::couponOptionsInBlocks, coupons, load.couponValues));
    double swaptions = load.swaptionValues.length;
    kernels.put("swo", new Kernel(load::swaptions, swaptions, load.swaptionValues));
    CalibrationWorkload fits = new CalibrationWorkload(Path.of(arguments[0]));
    kernels.put("cal", new Kernel(fits::calibrations, CalibrationWorkload.REPEATED, fits.found));
    kernels.put("price", new Kernel(fits::prices, fits.priceCount(), fits.price));
    kernels.put("gradient", new Kernel(fits::gradients, fits.priceCount(), fits.price));

    PathWork paths = new PathWork();
    double steps = PathWork.PATHS * (double) PathWork.STEPS;
    kernels.put("paths", new Kernel(() -> paths.plain(1), steps, new double[0]));
    kernels.put("paths_t2", new Kernel(() -> paths.plain(2), steps, new double[0]));
    kernels.put("paths_mirrored", new Kernel(paths::mirrored, steps, new double[0]));
    kernels.put("paths_sobol", new Kernel(paths::sobol, steps, new double[0]));

    CallableWork callable = new CallableWork(Path.of(arguments[0], "call.txt"), load.curve);
    kernels.put("callable", new Kernel(callable::price, callable.items, callable.values));

    BufferedReader in =
        new BufferedReader(new InputStreamReader(System.in, StandardCharsets.US_ASCII));
    PrintWriter out = new PrintWriter(System.out, true, StandardCharsets.US_ASCII);
    out.println("ready");
    for (String line = in.readLine(); line != null; line = in.readLine()) {
      String[] words = line.strip().split("\\s+");
      if (words[0].equals("quit")) {
        return;
      }
      if (words[0].equals("list")) {
        out.println(String.join(" ", kernels.keySet()));
        continue;
      }
      Kernel kernel = words.length > 1 ? kernels.get(words[1]) : null;
      if (kernel == null) {
        out.println("error unknown " + line);
      } else if (words[0].equals("run")) {
        long start = System.nanoTime();
        double check = kernel.work().getAsDouble();
        long took = System.nanoTime() - start;
        out.println(String.format(Locale.ROOT, "%d %s %s", took, kernel.items(), check));
      } else {
        kernel.work().getAsDouble();
        write(Path.of(words[2]), kernel.results());
        out.println("ok");
      }
    }
  }

  private static void write(Path file, double[] results) throws IOException {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < Math.min(2000, results.length); i++) {
      text.append(results[i]).append('\n');
    }
    Files.writeString(file, text);
  }
}
