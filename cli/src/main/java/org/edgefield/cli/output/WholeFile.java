package org.edgefield.cli.output;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import org.edgefield.cli.UserException;

/** A single text file, written whole or not at all. */
public final class WholeFile {
  private WholeFile() {}

  /**
   * Writes or replaces a file in one step.
   *
   * @throws UserException where the disk is full or refuses; an earlier file stays as it was
   */
  public static void write(Path file, String text) {
    Path target = file.toAbsolutePath();
    Path draft = target.resolveSibling("." + target.getFileName() + ".part");
    try {
      try (FileChannel channel =
          FileChannel.open(
              draft,
              StandardOpenOption.CREATE,
              StandardOpenOption.TRUNCATE_EXISTING,
              StandardOpenOption.WRITE)) {
        ByteBuffer bytes = StandardCharsets.UTF_8.encode(text);
        while (bytes.hasRemaining()) {
          channel.write(bytes);
        }
        channel.force(true);
      }
      Files.move(
          draft, target, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (IOException e) {
      throw new UserException("cannot write " + file + ": " + reason(e), e);
    } finally {
      removeQuietly(draft);
    }
  }

  private static String reason(IOException e) {
    return e instanceof java.nio.file.NoSuchFileException ? "no such folder" : e.getMessage();
  }

  private static void removeQuietly(Path draft) {
    try {
      Files.deleteIfExists(draft);
    } catch (IOException e) {
      draft.toFile().deleteOnExit();
    }
  }
}
