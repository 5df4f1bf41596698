package org.edgefield.models.cases;

import java.util.List;

/**
 * One electrode of a case.
 *
 * @param name name of the electrode
 * @param parts part names, with * for any text
 * @param voltage_V potential; 0 means earthed
 */
public record Terminal(String name, List<String> parts, double voltage_V) {
  /** An electrode of one part or name pattern. */
  static Terminal of(String part, double voltage_V) {
    return new Terminal(part, List.of(part), voltage_V);
  }
}
