package org.edgefield.field.result;

/** Which law gave a field value. */
public enum Law {
  /** Flux through parallel surfaces (curvatures and gap). */
  PARALLEL_SURFACES("curvature and gap"),
  /** Rounded-wedge law on a fillet of a thick body. */
  ROUNDED_WEDGE("rounded edge of a thick body"),
  /** Sharp edge with its radius as made. */
  EDGE_AS_MADE("sharp edge, radius as made"),
  /** Corner with its radius as made. */
  CORNER_AS_MADE("corner, radius as made"),
  /** Solved surface charge. */
  SOLVED("solved");

  private final String text;

  Law(String text) {
    this.text = text;
  }

  /** A few words for people. */
  public String text() {
    return text;
  }
}
