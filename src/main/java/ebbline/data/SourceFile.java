package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * A text file that was read, with its fingerprint.
 *
 * @param path as the user gave it
 * @param text decoded, without a byte-order mark
 * @param sha256 of its bytes, hexadecimal
 */
public record SourceFile(String path, String text, String sha256) {
  private static final int LARGEST = 1 << 26;
  private static final int LARGEST_BOOK = 1 << 30;
  private static final int CHUNK = 1 << 16;

  /**
   * Reads a file whole.
   *
   * @throws InputProblems if it is missing, a folder, empty, not readable, not UTF-8 text, or
   *     larger than 64 MiB
   */
  public static SourceFile read(String path) {
    return read(path, LARGEST, "64 MiB; curves, quotes, histories and models are smaller");
  }

  /** As {@link #read}, up to 1 GiB. */
  static SourceFile readBook(String path) {
    return read(path, LARGEST_BOOK, "1 GiB; split it");
  }

  private static SourceFile read(String path, int largest, String tooLarge) {
    try {
      return decoded(path, bytes(path, largest, tooLarge));
    } catch (OutOfMemoryError e) {
      throw problem(path, 0, "", "the file does not fit into memory; split it");
    }
  }

  private static SourceFile decoded(String path, byte[] bytes) {
    if (bytes.length == 0) {
      throw problem(path, 0, "", "the file is empty");
    }
    int from =
        bytes.length >= 3
                && bytes[0] == (byte) 0xEF
                && bytes[1] == (byte) 0xBB
                && bytes[2] == (byte) 0xBF
            ? 3
            : 0;
    ByteBuffer rest = ByteBuffer.wrap(bytes, from, bytes.length - from);
    try {
      String text = StandardCharsets.UTF_8.newDecoder().decode(rest).toString();
      if (text.isBlank()) {
        throw problem(path, 0, "", "the file holds nothing but blanks");
      }
      return new SourceFile(path, text, sha256(bytes));
    } catch (CharacterCodingException e) {
      int line = lineOf(bytes, rest.position());
      throw problem(
          path,
          line,
          String.format("byte %02X", bytes[Math.min(rest.position(), bytes.length - 1)]),
          "the text is not UTF-8; save the file as UTF-8");
    }
  }

  private static byte[] bytes(String path, int largest, String tooLarge) {
    try {
      Path file = Path.of(path);
      if (Files.isDirectory(file)) {
        throw problem(path, 0, "", "it is a folder; name a file in it");
      }
      // Neither a device nor a pipe knows its size, so that the bound is kept while reading.
      ByteArrayOutputStream all =
          new ByteArrayOutputStream((int) Math.min(largest, Files.size(file) + 1));
      try (InputStream in = Files.newInputStream(file)) {
        for (byte[] next = in.readNBytes(CHUNK); next.length > 0; next = in.readNBytes(CHUNK)) {
          if (all.size() + (long) next.length > largest) {
            throw problem(path, 0, "", "the file is larger than " + tooLarge);
          }
          boolean first = all.size() == 0;
          all.write(next, 0, next.length);
          refuseOtherEncodings(path, all, next, first);
        }
      }
      return all.toByteArray();
    } catch (NoSuchFileException e) {
      throw problem(path, 0, "", "there is no such file; check the path");
    } catch (AccessDeniedException e) {
      throw problem(path, 0, "", "permission denied; make the file readable");
    } catch (InvalidPathException e) {
      throw problem(path, 0, "", "this is no file name");
    } catch (IOException e) {
      throw problem(path, 0, "", "the file cannot be read: " + e.getMessage());
    }
  }

  private static void refuseOtherEncodings(
      String path, ByteArrayOutputStream all, byte[] next, boolean first) {
    boolean wide =
        first
            && next.length >= 2
            && ((next[0] == (byte) 0xFE && next[1] == (byte) 0xFF)
                || (next[0] == (byte) 0xFF && next[1] == (byte) 0xFE));
    if (wide) {
      throw problem(path, 1, "", "the text is UTF-16; save the file as UTF-8");
    }
    for (int i = 0; i < next.length; i++) {
      if (next[i] == 0) {
        throw problem(
            path,
            lineOf(all.toByteArray(), all.size() - next.length + i),
            "",
            "the file is binary; a text file was expected");
      }
    }
  }

  private static int lineOf(byte[] bytes, int at) {
    int line = 1;
    for (int i = 0; i < at && i < bytes.length; i++) {
      line += bytes[i] == '\n' ? 1 : 0;
    }
    return line;
  }

  private static InputProblems problem(String path, int line, String value, String expected) {
    return InputProblems.of(new InputProblem(path, line, "", value, expected));
  }

  private static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
