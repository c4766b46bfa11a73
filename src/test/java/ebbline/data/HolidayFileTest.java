package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.time.BusinessCalendar;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class HolidayFileTest {
  @TempDir Path folder;

  private BusinessCalendar read(String text) throws IOException {
    Path file = folder.resolve("holidays.csv");
    Files.writeString(file, text);
    return HolidayFile.read("desk", file.toString());
  }

  @Test
  void theYearsOfTheListAreThoseItKnows() throws IOException {
    BusinessCalendar desk = read("date,name\n2026-12-25,x\n2027-01-01,y\n");
    assertThat(desk.isBusinessDay(LocalDate.of(2026, 12, 25))).isFalse();
    assertThat(desk.isBusinessDay(LocalDate.of(2027, 12, 31))).isTrue();
    assertThatThrownBy(() -> desk.isBusinessDay(LocalDate.of(2028, 1, 3)))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("2028");
  }

  @Test
  void statedYearsNeedNoHoliday() throws IOException {
    BusinessCalendar desk = read("# first-year: 2026\n# last-year: 2030\ndate\n");
    assertThat(desk.isBusinessDay(LocalDate.of(2030, 12, 31))).isTrue();
  }

  @Test
  void whatIsWrongIsPlaced() {
    assertThatThrownBy(() -> read("date\n2026-12-25\n2026-12-25\n2026-13-01\n\"\"\n"))
        .isInstanceOf(InputProblems.class)
        .hasMessageContaining("stands twice")
        .hasMessageContaining("expected a date")
        .hasMessageContaining("a value is missing");
    assertThatThrownBy(() -> read("day\n2026-12-25\n")).isInstanceOf(InputProblems.class);
    assertThatThrownBy(() -> read("# first-year: soon\ndate\n2026-12-25\n"))
        .hasMessageContaining("expected a year");
    assertThatThrownBy(() -> read("# first-year: 2027\n# last-year: 2030\ndate\n2026-12-25\n"))
        .hasMessageContaining("2026-12-25");
    assertThatThrownBy(() -> read("date\n")).hasMessageContaining("no holidays");
  }
}
