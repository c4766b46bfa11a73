package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OutputPlacesTest {
  @TempDir private Path folder;

  private List<String> names() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void whatALinkPointsToIsReplacedAndTheLinkStays() throws IOException {
    Path target = Files.writeString(folder.resolve("target"), "old");
    Path link = Files.createSymbolicLink(folder.resolve("link"), target);
    AtomicFile.write(link, writer -> writer.write("new"));
    assertThat(Files.isSymbolicLink(link)).isTrue();
    assertThat(Files.readString(target)).isEqualTo("new");
    assertThat(names()).containsExactly("link", "target");
  }

  @Test
  void aFileKeepsWhoMayReadIt() throws IOException {
    Path file = Files.writeString(folder.resolve("private"), "old");
    Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rw-------"));
    AtomicFile.write(file, writer -> writer.write("new"));
    assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(file)))
        .isEqualTo("rw-------");
  }

  @Test
  void aNewFileIsAsOpenAsTheUsersOthers() throws IOException {
    Path plain = Files.createFile(folder.resolve("plain"));
    Path file = folder.resolve("new");
    AtomicFile.write(file, writer -> writer.write("x"));
    assertThat(Files.getPosixFilePermissions(file)).isEqualTo(Files.getPosixFilePermissions(plain));
  }

  @Test
  void theLongestNameCanBeWritten() throws IOException {
    Path file = folder.resolve("n".repeat(255));
    AtomicFile.write(file, writer -> writer.write("x"));
    assertThat(names()).hasSize(1);
  }

  @Test
  void aPartThatLiesAboutIsLeftAlone() throws IOException {
    Path other =
        Files.writeString(
            folder.resolve(".ebbline-" + ProcessHandle.current().pid() + "-0.part"), "other");
    AtomicFile.write(folder.resolve("new"), writer -> writer.write("x"));
    assertThat(Files.readString(other)).isEqualTo("other");
    assertThat(names()).hasSize(2);
  }

  @Test
  void aFullDiskIsNamedWithThePathThatWasAskedFor() {
    Path full = Path.of("/dev/full");
    if (Files.exists(full)) {
      assertThatThrownBy(() -> AtomicFile.write(full, writer -> writer.write("x".repeat(100_000))))
          .isInstanceOf(OutputProblem.class)
          .hasMessage("/dev/full: could not be written: No space left on device");
    }
  }

  @Test
  void aNameThatIsTooLongIsNamedOnce() {
    Path file = folder.resolve("n".repeat(256));
    assertThatThrownBy(() -> AtomicFile.write(file, writer -> writer.write("x")))
        .isInstanceOf(OutputProblem.class)
        .hasMessage(file + ": could not be written: File name too long");
  }
}
