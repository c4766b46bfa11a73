package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class AtomicFileTest {
  @TempDir private Path folder;

  @Test
  void aFileIsReplacedWhole() throws IOException {
    Path file = folder.resolve("out.txt");
    AtomicFile.write(file, writer -> writer.write("first"));
    AtomicFile.write(file, writer -> writer.write("zweite äö"));
    assertThat(Files.readString(file)).isEqualTo("zweite äö");
    assertOnly(file);
  }

  @Test
  void aFailureLeavesWhatWasThereAndNothingElse() throws IOException {
    Path file = folder.resolve("out.txt");
    Files.writeString(file, "old");
    assertThatThrownBy(
            () ->
                AtomicFile.write(
                    file,
                    writer -> {
                      writer.write("half");
                      throw new IOException("disk full");
                    }))
        .isInstanceOf(OutputProblem.class)
        .hasMessage(file + ": could not be written: disk full");
    assertThatThrownBy(
            () ->
                AtomicFile.write(
                    file,
                    writer -> {
                      throw new IllegalStateException("ours");
                    }))
        .isInstanceOf(IllegalStateException.class);
    assertThat(Files.readString(file)).isEqualTo("old");
    assertOnly(file);
  }

  private void assertOnly(Path file) throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      assertThat(files).containsExactly(file);
    }
  }

  @Test
  void placesThatCannotBeWrittenAreNamed() {
    assertThatThrownBy(() -> AtomicFile.write(folder, writer -> writer.write("x")))
        .hasMessageEndingWith("could not be written: it is a folder");
    assertThatThrownBy(
            () -> AtomicFile.write(folder.resolve("no/x.txt"), writer -> writer.write("x")))
        .hasMessageEndingWith("its folder does not exist");
  }
}
