package org.edgefield.importer.step;

import java.nio.file.Files;
import java.nio.file.Path;

/** Folders of the checkout that tests read from. */
final class Folders {
  private Folders() {}

  /** The committed models. */
  static Path models() {
    Path folder = Path.of("").toAbsolutePath();
    while (!Files.isDirectory(folder.resolve("test-models/step"))) {
      folder = folder.getParent();
    }
    return folder.resolve("test-models/step");
  }

  /** Public files beside the checkout, null where the folder is missing. */
  static Path corpus() {
    Path folder = models().getParent().getParent().resolve("../shared/step").normalize();
    return Files.isDirectory(folder) ? folder : null;
  }
}
