package org.edgefield.cli.output;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.channels.Channels;
import java.nio.channels.FileChannel;
import java.nio.file.DirectoryNotEmptyException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.locks.ReentrantLock;
import java.util.stream.Stream;
import org.edgefield.cli.UserException;

/**
 * A folder of results, written whole or not at all: all files are written and forced to disk in a
 * hidden folder, then moved into place. Files of others in the target stay; those of an earlier run
 * go first, so that old and new never mix: killed in between, the folder lacks its result.json. A
 * stop waits for the few moves, a fault among them brings the earlier files back, and what either
 * leaves behind is removed.
 */
public final class OutputFolder {
  private static final int BUFFER = 1 << 16;
  private static final String ASIDE = "earlier";

  /** Every file that a run may leave in its folder, the one that vouches for the others first. */
  private static final List<String> OF_A_RUN =
      List.of("result.json", "heatmap.glb", "summary.md", "gate.json", "junit.xml");

  private final Path target;
  private final Map<String, Content> files = new LinkedHashMap<>();

  /** Held while a file is written or the set is moved; a stop takes it and keeps it. */
  private final ReentrantLock work = new ReentrantLock();

  /** Content of one file. */
  @FunctionalInterface
  public interface Content {
    /** Writes the bytes; the stream is closed by the caller. */
    void write(OutputStream out) throws IOException;
  }

  /** Results for a folder that need not exist yet. */
  public OutputFolder(Path target) {
    this.target = target.toAbsolutePath().normalize();
  }

  /**
   * Refuses a target that cannot become a folder, before any work is done for it.
   *
   * @throws UserException naming the path and the cure
   */
  public void check() {
    if (Files.exists(target) && !Files.isDirectory(target)) {
      throw new UserException(target + " is a file: name a folder with --out");
    }
    Path parent = existingParent();
    Path place = Files.isDirectory(target) ? target : parent;
    if (!Files.isWritable(place)) {
      throw new UserException(place + " cannot be written: name another folder with --out");
    }
  }

  private Path existingParent() {
    Path parent = target.getParent();
    while (parent != null && !Files.isDirectory(parent)) {
      parent = parent.getParent();
    }
    return parent == null ? target.getRoot() : parent;
  }

  /** The folder. */
  public Path target() {
    return target;
  }

  /** Adds a file; the last one added is moved into place last. */
  public OutputFolder add(String name, Content content) {
    files.put(name, content);
    return this;
  }

  /**
   * Writes everything.
   *
   * @throws UserException where the disk is full or refuses; nothing is left half written then
   */
  public void write() {
    Path draft = null;
    Thread removal = null;
    try {
      // Inside an existing folder: it may be a disk of its own, or its surroundings be protected.
      Path place = Files.isDirectory(target) ? target : target.getParent();
      Files.createDirectories(place);
      draft = Files.createTempDirectory(place, "." + target.getFileName() + ".");
      Path half = draft;
      removal = new Thread(() -> stop(half));
      Runtime.getRuntime().addShutdownHook(removal);
      for (Map.Entry<String, Content> file : files.entrySet()) {
        work.lock();
        try {
          save(draft.resolve(file.getKey()), file.getValue());
        } finally {
          work.unlock();
        }
      }
      work.lock();
      try {
        if (!moved(draft)) {
          replace(draft);
        }
      } finally {
        work.unlock();
      }
    } catch (IOException e) {
      throw new UserException(
          "cannot write " + target + ": " + reason(e) + "; nothing was kept", e);
    } finally {
      if (draft != null) {
        remove(draft);
      }
      release(removal);
    }
  }

  // A new folder appears in one move; into an existing one the files go one by one.
  private boolean moved(Path draft) throws IOException {
    if (Files.exists(target)) {
      return false;
    }
    try {
      openToOthers(draft);
      Files.move(draft, target, StandardCopyOption.ATOMIC_MOVE);
      return true;
    } catch (DirectoryNotEmptyException e) {
      return false;
    }
  }

  private void replace(Path draft) throws IOException {
    Path aside = Files.createDirectory(draft.resolve(ASIDE));
    Set<String> earlier = new LinkedHashSet<>(OF_A_RUN);
    earlier.addAll(files.keySet());
    List<String> placed = new ArrayList<>();
    try {
      for (String name : earlier) {
        if (Files.isRegularFile(target.resolve(name))) {
          Files.move(target.resolve(name), aside.resolve(name), StandardCopyOption.ATOMIC_MOVE);
        }
      }
      for (String name : files.keySet()) {
        Files.move(draft.resolve(name), target.resolve(name), StandardCopyOption.ATOMIC_MOVE);
        placed.add(name);
      }
    } catch (IOException e) {
      restore(aside, placed);
      throw e;
    }
  }

  private void restore(Path aside, List<String> placed) throws IOException {
    for (String name : placed) {
      Files.delete(target.resolve(name));
    }
    for (Path file : list(aside)) {
      Files.move(file, target.resolve(file.getFileName()), StandardCopyOption.ATOMIC_MOVE);
    }
  }

  // Never gives the lock back: the writing thread waits at its next file until the process is gone.
  private void stop(Path draft) {
    work.lock();
    remove(draft);
  }

  // A temporary folder is private; the result takes the usual rights of its surroundings.
  private static void openToOthers(Path draft) throws IOException {
    if (draft.getFileSystem().supportedFileAttributeViews().contains("posix")) {
      Files.setPosixFilePermissions(
          draft, java.nio.file.attribute.PosixFilePermissions.fromString("rwxr-xr-x"));
    }
  }

  private static void save(Path file, Content content) throws IOException {
    try (FileChannel channel =
        FileChannel.open(file, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
      OutputStream out = new BufferedOutputStream(Channels.newOutputStream(channel), BUFFER);
      content.write(out);
      out.flush();
      channel.force(true);
    }
  }

  private static String reason(IOException e) {
    if (e instanceof FileSystemException f && f.getReason() != null) {
      return f.getReason();
    }
    return e.getMessage() == null ? e.getClass().getSimpleName() : e.getMessage();
  }

  private static void remove(Path folder) {
    if (!Files.isDirectory(folder)) {
      return;
    }
    try {
      for (Path inside : list(folder)) {
        remove(inside);
        Files.deleteIfExists(inside);
      }
      Files.deleteIfExists(folder);
    } catch (IOException e) {
      // Best effort: the folder is hidden and its name says what it is.
      return;
    }
  }

  private static List<Path> list(Path folder) throws IOException {
    try (Stream<Path> inside = Files.list(folder)) {
      return inside.toList();
    }
  }

  private static void release(Thread removal) {
    if (removal == null) {
      return;
    }
    try {
      Runtime.getRuntime().removeShutdownHook(removal);
    } catch (IllegalStateException e) {
      // The process is ending; the hook runs as it should.
      return;
    }
  }
}
