package org.edgefield.importer.kernel;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.net.URL;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.PosixFilePermissions;

/**
 * Native files of this module. From a class folder they are used where they lie; from a jar they
 * are unpacked once into a folder beside the jar and found there by later runs. Where that folder
 * cannot be written they go to a private temporary folder that is removed when the program ends.
 */
public final class NativeFiles {
  private static final String FOLDER = "linux-x86_64/";
  private static final String LIBRARY = "libjniKernel.so";
  private static final String READER = "step-reader";

  private NativeFiles() {}

  /** The native library that evaluates geometry in process. */
  static Path library() {
    return Located.LIBRARY_FILE;
  }

  /** The executable that reads STEP files in a process of its own. */
  public static Path stepReader() {
    return Located.READER_FILE;
  }

  private static final class Located {
    static final Path LIBRARY_FILE = locate(LIBRARY);
    static final Path READER_FILE = locate(READER);
  }

  private static Path locate(String name) {
    URL url = NativeFiles.class.getResource(FOLDER + name);
    if (url == null) {
      throw new UnsatisfiedLinkError(
          name + " is not packed with this build: only Linux on x86-64 is supported");
    }
    try {
      if (url.getProtocol().equals("file")) {
        return Path.of(url.toURI());
      }
      Path jar =
          Path.of(NativeFiles.class.getProtectionDomain().getCodeSource().getLocation().toURI());
      return besideJar(url, jar, name);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    } catch (URISyntaxException e) {
      throw new IllegalStateException(e);
    }
  }

  private static Path besideJar(URL url, Path jar, String name) throws IOException {
    // Size and time of the jar stamp its files, so that a newer build never meets an old library.
    String stamp =
        Long.toHexString(Files.size(jar))
            + "-"
            + Long.toHexString(Files.getLastModifiedTime(jar).toMillis());
    Path folder =
        jar.resolveSibling(
            jar.getFileName().toString().replaceFirst("\\.jar$", "") + ".native-" + stamp);
    Path file = folder.resolve(name);
    if (Files.isExecutable(file)) {
      return file;
    }
    if (!Files.isWritable(jar.toAbsolutePath().getParent())) {
      Path temporary = Files.createTempDirectory("edgefield-native");
      file = temporary.resolve(name);
      unpack(url, file);
      file.toFile().deleteOnExit();
      // Hooks of deleteOnExit run in reverse order: the file goes before its folder.
      temporary.toFile().deleteOnExit();
      file.toFile().deleteOnExit();
      return file;
    }
    Files.createDirectories(folder);
    Path part = Files.createTempFile(folder, name, ".part");
    unpack(url, part);
    try {
      Files.move(part, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException | FileAlreadyExistsException e) {
      Files.move(part, file, StandardCopyOption.REPLACE_EXISTING);
    }
    return file;
  }

  private static void unpack(URL url, Path file) throws IOException {
    try (InputStream in = url.openStream()) {
      Files.copy(in, file, StandardCopyOption.REPLACE_EXISTING);
    }
    Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rwxr-xr-x"));
  }
}
