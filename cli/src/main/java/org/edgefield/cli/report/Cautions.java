package org.edgefield.cli.report;

import java.util.List;

/** What every reader of a verdict must know; stands wherever the verdict stands. */
public final class Cautions {
  private static final List<String> ALL =
      List.of(
          "Inception is not breakdown: in strongly non-uniform gaps corona starts well below"
              + " flashover.",
          "Polarity is not in the criterion.",
          "Dirt, rain, ice, scratches and burrs beyond the edge radius as made are not counted.",
          "Solid insulation is not part of the field; its surfaces and its own strength need their"
              + " own proof.",
          "Results inform a design; they replace no type test.");
  private static final String SCREEN =
      "A screen is a quick estimate from curvature and gap: it tells where to look. Shielding by"
          + " neighbouring edges and parts is not in it.";

  private Cautions() {}

  /** The cautions for a method. */
  public static List<String> of(String method) {
    if (!method.equals("screen")) {
      return ALL;
    }
    List<String> all = new java.util.ArrayList<>();
    all.add(SCREEN);
    all.addAll(ALL);
    return all;
  }
}
