package org.edgefield.importer.step;

import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;

/**
 * A temporary folder for one read, removed on close and, when the program is stopped in between, by
 * a shutdown hook.
 */
final class PrivateFolder implements AutoCloseable {
  private final Path path;
  private final Thread hook;

  PrivateFolder() throws IOException {
    path = Files.createTempDirectory("edgefield-read");
    hook = new Thread(this::removeQuietly, "remove " + path);
    Runtime.getRuntime().addShutdownHook(hook);
  }

  Path path() {
    return path;
  }

  /** Other threads and the child may still write or remove: what is gone is gone. */
  private void remove() throws IOException {
    try (DirectoryStream<Path> files = Files.newDirectoryStream(path)) {
      for (Path file : files) {
        Files.deleteIfExists(file);
      }
    } catch (NoSuchFileException e) {
      return;
    }
    Files.deleteIfExists(path);
  }

  private void removeQuietly() {
    try {
      remove();
    } catch (IOException e) {
      // The program is ending: there is nobody left to tell.
      path.toFile().deleteOnExit();
    }
  }

  @Override
  public void close() throws IOException {
    remove();
    try {
      Runtime.getRuntime().removeShutdownHook(hook);
    } catch (IllegalStateException e) {
      // Shutdown has begun: the hook finds nothing left to remove.
      return;
    }
  }
}
