package org.edgefield.field.job;

import java.util.List;

/**
 * Everything a screen or a solve needs beside the model.
 *
 * @param electrodes in the order of the case file
 * @param ignored indices of parts that take no part
 * @param surroundings gas, earth plane, ambient field
 * @param edges edge radius as made
 * @param duties at least one
 * @param permitted rule for the permitted field
 */
public record FieldCase(
    List<Electrode> electrodes,
    List<Integer> ignored,
    Surroundings surroundings,
    EdgesAsMade edges,
    List<Duty> duties,
    Permitted permitted) {

  /** Electrode index per part, -1 where the part is ignored. */
  public int[] electrodeOfPart(int partCount) {
    int[] of = new int[partCount];
    java.util.Arrays.fill(of, -1);
    for (int e = 0; e < electrodes.size(); e++) {
      for (int p : electrodes.get(e).parts()) {
        of[p] = e;
      }
    }
    return of;
  }
}
