package org.edgefield.curvature;

import java.nio.file.Path;
import org.edgefield.importer.Progress;
import org.edgefield.importer.kernel.KernelAssembly;
import org.edgefield.importer.step.ReadLimits;
import org.edgefield.importer.step.StepReader;

/** Reads the committed test models. */
public final class Models {
  /** Folder of the committed STEP files, as seen from a module. */
  public static final Path STEP = Path.of("..", "test-models", "step");

  /** Folder of public STEP files beside the project; tests that need it are skipped without. */
  public static final Path CORPUS = Path.of("..", "..", "shared", "step");

  private Models() {}

  /** Opens a committed model. */
  public static KernelAssembly open(String file) {
    return open(STEP.resolve(file));
  }

  /** Opens a model. */
  public static KernelAssembly open(Path file) {
    return StepReader.read(file, ReadLimits.defaults(), Progress.NONE);
  }
}
