package org.edgefield.cli.casefile.yaml;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Collectors;
import org.edgefield.cli.UserException;

/** Gathers what is wrong with a case file, so that one run shows it all. */
public final class Problems {
  private static final int SHOWN = 20;

  private final String file;
  private final List<Problem> found = new ArrayList<>();

  /** Starts with none. */
  public Problems(String file) {
    this.file = file;
  }

  /** Notes a problem at a place. */
  public void add(Place place, String message) {
    found.add(new Problem(place, message));
  }

  /**
   * Ends the run where there are problems.
   *
   * @throws UserException with one line per problem: file, line, column, what is wrong, the cure
   */
  public void throwIfAny() {
    if (found.isEmpty()) {
      return;
    }
    List<Problem> sorted = new ArrayList<>(found);
    sorted.sort(
        Comparator.comparingInt((Problem p) -> p.place().line())
            .thenComparingInt(p -> p.place().column()));
    String text =
        sorted.stream()
            .limit(SHOWN)
            .map(p -> file + ":" + p.place() + ": " + p.message())
            .collect(Collectors.joining("\n"));
    if (sorted.size() > SHOWN) {
      text += "\nand " + (sorted.size() - SHOWN) + " more";
    }
    throw new UserException(text);
  }

  /** Whether nothing is wrong so far. */
  public boolean isEmpty() {
    return found.isEmpty();
  }

  private record Problem(Place place, String message) {}
}
