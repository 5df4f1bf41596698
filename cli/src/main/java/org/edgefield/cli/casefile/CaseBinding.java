package org.edgefield.cli.casefile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.edgefield.cli.UserException;
import org.edgefield.cli.casefile.CaseFile.DutyEntry;
import org.edgefield.cli.casefile.CaseFile.ElectrodeEntry;
import org.edgefield.cli.casefile.CaseFile.PartRadius;
import org.edgefield.cli.casefile.CaseFile.VoltageEntry;
import org.edgefield.cli.casefile.yaml.Place;
import org.edgefield.cli.casefile.yaml.Problems;
import org.edgefield.cli.casefile.yaml.Text;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.EdgesAsMade;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.edgefield.importer.brep.Part;

/** Joins a case file with the parts of its model. */
public final class CaseBinding {
  private static final int SUGGESTIONS = 3;
  private static final int NAMED_PARTS = 8;

  private final CaseFile file;
  private final List<Part> parts;
  private final Problems problems;

  /** First claim per part. */
  private final Map<Integer, Claim> claims = new HashMap<>();

  private CaseBinding(CaseFile file, List<Part> parts) {
    this.file = file;
    this.parts = parts;
    this.problems = new Problems(file.file().toString());
  }

  /**
   * The case over the model's parts.
   *
   * @throws UserException where a pattern matches nothing, or a part is claimed twice or by nobody
   */
  public static FieldCase bind(CaseFile file, List<Part> parts) {
    return new CaseBinding(file, parts).bind();
  }

  private FieldCase bind() {
    List<Electrode> electrodes = new ArrayList<>();
    for (ElectrodeEntry entry : file.electrodes()) {
      String by = "electrode \"" + entry.name().value() + '"';
      int[] claimed = claim(entry.parts(), by);
      electrodes.add(new Electrode(entry.name().value(), claimed, entry.kind()));
    }
    int[] ignored = claim(file.ignore(), "\"ignore\"");
    refuseUnclaimed();
    Map<Integer, Double> radii = new HashMap<>();
    for (PartRadius radius : file.edges().perPart()) {
      for (int p : matching(radius.pattern())) {
        radii.put(p, radius.radius_m());
      }
    }
    problems.throwIfAny();
    return new FieldCase(
        electrodes,
        Arrays.stream(ignored).boxed().toList(),
        file.surroundings(),
        new EdgesAsMade(file.edges().radius_m(), Map.copyOf(radii)),
        file.duties().stream().map(d -> duty(d, electrodes)).toList(),
        file.permitted());
  }

  private int[] claim(List<Text> patterns, String by) {
    List<Integer> claimed = new ArrayList<>();
    for (Text pattern : patterns) {
      for (int p : matching(pattern)) {
        Claim earlier = claims.putIfAbsent(p, new Claim(by, pattern.place()));
        if (earlier == null) {
          claimed.add(p);
        } else if (!earlier.by().equals(by)) {
          problems.add(
              pattern.place(),
              "part \""
                  + parts.get(p).path()
                  + "\" is claimed by "
                  + by
                  + " and, at "
                  + earlier.place()
                  + ", by "
                  + earlier.by()
                  + ": a part belongs to one of them");
        }
      }
    }
    return claimed.stream().sorted().mapToInt(Integer::intValue).toArray();
  }

  private List<Integer> matching(Text pattern) {
    Glob glob = new Glob(pattern.value());
    List<Integer> found = parts.stream().filter(glob::matches).map(Part::index).toList();
    if (found.isEmpty()) {
      List<String> known =
          parts.stream().flatMap(p -> Stream.of(p.name(), p.path())).distinct().toList();
      List<String> near = Nearest.few(pattern.value(), known, SUGGESTIONS);
      problems.add(
          pattern.place(),
          "no part matches \""
              + pattern.value()
              + "\"; nearest names: "
              + String.join(", ", near.stream().map(n -> '"' + n + '"').toList()));
    }
    return found;
  }

  private void refuseUnclaimed() {
    List<String> unclaimed =
        parts.stream()
            .filter(p -> !claims.containsKey(p.index()))
            .map(p -> '"' + p.path() + '"')
            .toList();
    if (unclaimed.isEmpty()) {
      return;
    }
    String names = String.join(", ", unclaimed.subList(0, Math.min(NAMED_PARTS, unclaimed.size())));
    if (unclaimed.size() > NAMED_PARTS) {
      names += " and " + (unclaimed.size() - NAMED_PARTS) + " more";
    }
    problems.add(
        file.electrodes().get(0).name().place(),
        (unclaimed.size() == 1 ? "part " : "parts ")
            + names
            + (unclaimed.size() == 1 ? " belongs" : " belong")
            + " to no electrode: add to an electrode's \"parts\" or to \"ignore\"");
  }

  private static Duty duty(DutyEntry entry, List<Electrode> electrodes) {
    double[] real = new double[electrodes.size()];
    double[] imaginary = new double[electrodes.size()];
    for (VoltageEntry voltage : entry.voltages()) {
      for (int e = 0; e < electrodes.size(); e++) {
        if (electrodes.get(e).name().equals(voltage.electrode().value())) {
          real[e] = voltage.voltage().real_V();
          imaginary[e] = voltage.voltage().imaginary_V();
        }
      }
    }
    return new Duty(entry.name(), real, imaginary);
  }

  private record Claim(String by, Place place) {}
}
