package org.edgefield.importer.step;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.CompletableFuture;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.Progress;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.kernel.KernelAssembly;

/**
 * Reads STEP files (AP203, AP214, AP242). A child process reads, checks and triangulates; only its
 * checked result is loaded here.
 */
public final class StepReader {
  /** Equipment below and above these sizes suggests a slip of the length unit. */
  private static final double SMALL_M = 1e-3;

  private static final double LARGE_M = 50;
  private static final double MM = 1e-3;

  private StepReader() {}

  /**
   * Reads a model.
   *
   * @param file STEP file
   * @param limits what it may cost
   * @param progress receives the phases; may cancel
   * @return the model, to be closed by the caller
   * @throws ModelException with one line when the file is missing, damaged, empty or beyond a limit
   */
  public static KernelAssembly read(Path file, ReadLimits limits, Progress progress) {
    requireFile(file);
    try (PrivateFolder folder = new PrivateFolder();
        ReaderProcess reader = new ReaderProcess(file, folder.path(), limits)) {
      // While the child works: digest of the file and the native library.
      CompletableFuture<String> digest = CompletableFuture.supplyAsync(() -> sha256(file));
      KernelAssembly.loadLibrary();
      reader.await(progress);
      return load(file, folder.path(), digest.join());
    } catch (IOException e) {
      throw new ModelException(
          file + ": cannot be read (" + e.getMessage() + "); check disk space and permissions", e);
    }
  }

  private static void requireFile(Path file) {
    if (!Files.exists(file)) {
      throw new ModelException(file + ": no such file; check the path of the model");
    }
    if (Files.isDirectory(file)) {
      throw new ModelException(file + ": is a folder; name the STEP file inside it");
    }
    if (!Files.isReadable(file)) {
      throw new ModelException(file + ": not readable; check its permissions");
    }
  }

  private static KernelAssembly load(Path file, Path folder, String sha256) throws IOException {
    String unit = "";
    String schema = "";
    List<String> warnings = new ArrayList<>();
    List<KernelAssembly.PartRecord> parts = new ArrayList<>();
    for (String text : Files.readAllLines(folder.resolve("bodies.txt"), StandardCharsets.UTF_8)) {
      ReaderLine line = ReaderLine.parse(text);
      switch (line.word()) {
        case "unit" -> unit = unitName(line.field(0));
        case "schema" -> schema = line.field(0);
        case "warning" -> warnings.add(warning(line));
        case "part" -> parts.add(part(line));
        default -> throw new IllegalStateException("unknown line " + text);
      }
    }
    warnAboutSize(parts, unit, warnings);
    return KernelAssembly.load(
        folder.resolve("bodies.bin"),
        parts,
        new Assembly.Source(file.toString(), sha256, unit, schema),
        warnings);
  }

  private static KernelAssembly.PartRecord part(ReaderLine line) {
    double[] bounds = new double[6];
    for (int i = 0; i < 6; i++) {
      bounds[i] = line.number(4 + i) * MM;
    }
    float[] colour = null;
    if (line.fields().size() > 10) {
      colour =
          new float[] {(float) line.number(10), (float) line.number(11), (float) line.number(12)};
    }
    return new KernelAssembly.PartRecord(
        line.field(0),
        line.field(1),
        colour,
        bounds,
        line.number(2) * MM * MM * MM,
        line.number(3) * MM * MM);
  }

  private static String unitName(String kernelName) {
    return switch (kernelName.toLowerCase(Locale.ROOT)) {
      case "" -> "mm";
      case "millimetre" -> "mm";
      case "centimetre" -> "cm";
      case "metre" -> "m";
      case "micrometre" -> "um";
      case "kilometre" -> "km";
      default -> kernelName.toLowerCase(Locale.ROOT);
    };
  }

  private static String warning(ReaderLine line) {
    String a = line.field(1);
    String b = line.field(2);
    return switch (line.field(0)) {
      case "closed-surface" ->
          "part '" + a + "' is a closed surface, not a solid: taken as a solid";
      case "sheets-ignored" ->
          a + " surfaces that bound no solid are left out, the first in '" + b + "'";
      case "remarks-ignored" ->
          a + " damaged entries beside the shape (notes, styles) are left out, the first is " + b;
      default -> throw new IllegalStateException("unknown warning " + line);
    };
  }

  private static void warnAboutSize(
      List<KernelAssembly.PartRecord> parts, String unit, List<String> warnings) {
    double largest = 0;
    String name = "";
    for (KernelAssembly.PartRecord p : parts) {
      double[] b = p.bounds_m();
      double size = Math.max(b[3] - b[0], Math.max(b[4] - b[1], b[5] - b[2]));
      if (size > largest) {
        largest = size;
        name = p.path();
      }
    }
    if (largest > LARGE_M || largest < SMALL_M) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "part '%s', the largest, is %.4g m long: check that the file's length unit (%s) is"
                  + " what the model was drawn in",
              name,
              largest,
              unit));
    }
  }

  private static String sha256(Path file) {
    try {
      return HexFormat.of()
          .formatHex(MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(file)));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException(e);
    } catch (IOException e) {
      throw new ModelException(file + ": cannot be read (" + e.getMessage() + "); try again", e);
    }
  }
}
