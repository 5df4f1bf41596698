package org.edgefield.importer.step;

import org.edgefield.importer.ModelException;

/** Turns what the reader process found into one line: file, entity or part, and the cure. */
final class Refusals {
  private static final String EXPORT_AGAIN = "export the model again as AP203, AP214 or AP242";

  private Refusals() {}

  /**
   * The exception for a refusal.
   *
   * @param file file name for the user
   * @param refusal a "refuse" line: code, then its arguments
   */
  static ModelException of(String file, ReaderLine refusal) {
    return new ModelException(file + ": " + sentence(refusal).replaceAll("\\s+", " ").strip());
  }

  private static String sentence(ReaderLine r) {
    String a = r.field(1);
    String b = r.field(2);
    String c = r.field(3);
    String d = r.field(4);
    return switch (r.field(0)) {
      case "unreadable" -> "the STEP text cannot be parsed; " + EXPORT_AGAIN;
      case "no-entities" -> "holds no STEP entities; " + EXPORT_AGAIN;
      case "check-fail" -> "entity " + orUnknown(a) + " is damaged (" + b + "); " + EXPORT_AGAIN;
      case "assembly-depth" ->
          part(a, "")
              + " is nested more than 200 levels deep; flatten the assembly or break its loop";
      case "no-solid" -> "holds no solid body; export the solids, not only structure or notes";
      case "curves-only" -> "holds only curves, no solid body; export the solids";
      case "sheets-only" ->
          "holds only surfaces ("
              + c
              + "), no solid body: "
              + part(a, b)
              + " is open; close it to a solid in the CAD system and export again";
      case "open-shell" ->
          part(a, b)
              + " is not closed: "
              + c
              + " open edges, the first near "
              + d
              + "; close the gap in the CAD system (sew or fill) and export as a solid";
      case "crowded-edge" ->
          part(a, b)
              + " has an edge that joins "
              + c
              + " faces near "
              + d
              + "; separate the bodies that touch there and export again";
      case "no-faces" -> part(a, b) + " has no faces; remove it or export it again";
      case "no-thickness" ->
          part(a, b)
              + " has no thickness ("
              + c
              + " mm2 of surface enclose no volume); thicken the sheet to a solid";
      case "unbounded" -> part(a, b) + " reaches to infinity; trim its faces and export again";
      case "too-large" ->
          part(a, b)
              + " reaches to "
              + c
              + " mm, beyond the limit of "
              + d
              + " mm; check its coordinates and the length unit";
      case "unmeshable" ->
          part(a, b) + " has a face that cannot be triangulated; repair the face and export again";
      case "memory" -> "needs more memory than the reader may use; simplify the model or split it";
      case "unwritable" -> "temporary folder " + a + " cannot be written; free some disk space";
      case "kernel" -> "the CAD kernel gave up (" + a + "); " + EXPORT_AGAIN;
      default -> throw new IllegalStateException("unknown refusal " + r);
    };
  }

  private static String orUnknown(String entity) {
    return entity.isEmpty() ? "(unnumbered)" : entity;
  }

  private static String part(String path, String entity) {
    return "part '" + path + "'" + (entity.isEmpty() ? "" : " (" + entity + ")");
  }
}
