package ebbline.data;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;

/** Files that are whole or absent: written beside their place and moved into it. */
public final class AtomicFile {
  private static final int MOST_NAMES = 10_000;

  private AtomicFile() {}

  /** Writes the content of a file. */
  @FunctionalInterface
  public interface Content {
    void writeTo(Writer writer) throws IOException;
  }

  /**
   * Writes a UTF-8 file whole or leaves what was there.
   *
   * @throws OutputProblem if it cannot be written
   */
  public static void write(Path path, Content content) {
    if (Files.isDirectory(path)) {
      throw new OutputProblem(path.toString(), "it is a folder");
    }
    if (Files.exists(path) && !Files.isRegularFile(path)) {
      writeThrough(path, content); // a device or a pipe cannot be replaced
      return;
    }
    Path beside = null;
    try {
      // What a link points to is replaced, not the link.
      Path target = Files.exists(path) ? path.toRealPath() : path.toAbsolutePath();
      Path folder = target.getParent();
      if (folder == null || !Files.isDirectory(folder)) {
        throw new OutputProblem(path.toString(), "its folder does not exist");
      }
      beside = beside(folder);
      try (Writer writer = writer(beside)) {
        content.writeTo(writer);
      }
      keepPermissions(target, beside);
      move(beside, target);
      beside = null;
    } catch (IOException e) {
      throw new OutputProblem(path.toString(), reason(e));
    } finally {
      remove(beside);
    }
  }

  /** A new file that nobody else has, as open as the user's new files are. */
  private static Path beside(Path folder) throws IOException {
    long process = ProcessHandle.current().pid();
    for (int i = 0; ; i++) {
      try {
        return Files.createFile(folder.resolve(".ebbline-" + process + "-" + i + ".part"));
      } catch (FileAlreadyExistsException e) {
        if (i == MOST_NAMES) {
          throw e;
        }
      }
    }
  }

  private static void writeThrough(Path path, Content content) {
    try (Writer writer =
        new BufferedWriter(
            new OutputStreamWriter(
                Files.newOutputStream(path, StandardOpenOption.WRITE), StandardCharsets.UTF_8))) {
      content.writeTo(writer);
    } catch (IOException e) {
      throw new OutputProblem(path.toString(), reason(e));
    }
  }

  private static Writer writer(Path path) throws IOException {
    return Files.newBufferedWriter(path, StandardCharsets.UTF_8);
  }

  private static void keepPermissions(Path path, Path beside) throws IOException {
    if (Files.exists(path)
        && path.getFileSystem().supportedFileAttributeViews().contains("posix")) {
      Files.setPosixFilePermissions(beside, Files.getPosixFilePermissions(path));
    }
  }

  private static void move(Path from, Path to) throws IOException {
    try {
      Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException e) {
      Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
    }
  }

  private static void remove(Path beside) {
    if (beside != null) {
      try {
        Files.deleteIfExists(beside);
      } catch (IOException e) {
        beside.toFile().deleteOnExit();
      }
    }
  }

  private static String reason(IOException e) {
    if (e instanceof AccessDeniedException) {
      return "permission denied";
    } else if (e instanceof NoSuchFileException) {
      return "its folder does not exist";
    }
    // A file system's own message starts with the path of the file beside.
    String message = e instanceof FileSystemException f ? f.getReason() : e.getMessage();
    return message == null ? e.getClass().getSimpleName() : message;
  }
}
