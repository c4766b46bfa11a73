package ebbline.cli;

import ebbline.data.HolidayFile;
import ebbline.time.CalendarRegistry;
import java.util.List;
import picocli.CommandLine.Option;

/** Calendars of the user's own. */
final class HolidayOptions {
  @Option(
      names = "--holidays",
      paramLabel = "NAME=FILE",
      description = "a calendar of your own: a file of holidays, column date; repeatable")
  private List<String> files = List.of();

  /** The calendars the program knows, and those of the files. */
  CalendarRegistry calendars() {
    CalendarRegistry calendars = CalendarRegistry.standard();
    for (String each : files) {
      int equals = each.indexOf('=');
      if (equals < 1 || equals == each.length() - 1) {
        throw UsageProblem.of("--holidays", each, "expected NAME=FILE, such as desk=holidays.csv");
      }
      try {
        calendars =
            calendars.with(HolidayFile.read(each.substring(0, equals), each.substring(equals + 1)));
      } catch (IllegalArgumentException e) {
        throw UsageProblem.of("--holidays", each, e.getMessage());
      }
    }
    return calendars;
  }
}
