package org.edgefield.cli.casefile.yaml;

/**
 * A place in a text file.
 *
 * @param line from 1
 * @param column from 1
 */
public record Place(int line, int column) {
  @Override
  public String toString() {
    return line + ":" + column;
  }
}
