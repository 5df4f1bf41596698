package org.edgefield.curvature.feature;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.edgefield.importer.brep.Part;

/**
 * Full names of places for people: "rounded edge R2 of Busbar L1". A part goes by its name where
 * that is unique in the model, else by its instance path.
 */
public final class PlaceNames {
  private final String[] partNames;

  /** Names for the parts of one model, in the order of their indices. */
  public PlaceNames(List<Part> parts) {
    Map<String, Integer> uses = new HashMap<>();
    for (Part p : parts) {
      uses.merge(p.name(), 1, Integer::sum);
    }
    partNames = new String[parts.size()];
    for (Part p : parts) {
      partNames[p.index()] = uses.get(p.name()) == 1 ? p.name() : p.path();
    }
  }

  /** Name of a part that no other part has. */
  public String part(int part) {
    return partNames[part];
  }

  /**
   * Full name of a place.
   *
   * @param feature name of the place within its part, as {@code Features} gives it
   * @param part index of the part
   */
  public String of(String feature, int part) {
    return feature + " of " + partNames[part];
  }
}
