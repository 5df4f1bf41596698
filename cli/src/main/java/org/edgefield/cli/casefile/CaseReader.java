package org.edgefield.cli.casefile;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.edgefield.cli.UserException;
import org.edgefield.cli.casefile.CaseFile.DutyEntry;
import org.edgefield.cli.casefile.CaseFile.EdgesEntry;
import org.edgefield.cli.casefile.CaseFile.ElectrodeEntry;
import org.edgefield.cli.casefile.CaseFile.PartRadius;
import org.edgefield.cli.casefile.CaseFile.VoltageEntry;
import org.edgefield.cli.casefile.units.Dimension;
import org.edgefield.cli.casefile.units.Phasor;
import org.edgefield.cli.casefile.units.QuantityException;
import org.edgefield.cli.casefile.yaml.Place;
import org.edgefield.cli.casefile.yaml.Problems;
import org.edgefield.cli.casefile.yaml.Text;
import org.edgefield.cli.casefile.yaml.YamlMap;
import org.edgefield.cli.casefile.yaml.YamlText;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.Permitted;
import org.edgefield.importer.mesh.MeshSettings;

/**
 * Reads a case file. Everything wrong with it is found in one go and told with line and column;
 * what needs the model (patterns that match nothing, parts nobody claims) is told by {@link
 * CaseBinding}.
 */
public final class CaseReader {
  /** Edge radius where the case file gives none, metres. */
  static final double DEFAULT_EDGE_M = 0.2e-3;

  private static final long LARGEST_BYTES = 1 << 20;
  private static final double DEFAULT_FIELD_V_PER_M = 3e6;

  private final Path file;
  private final Problems problems;

  private CaseReader(Path file) {
    this.file = file;
    this.problems = new Problems(file.toString());
  }

  /**
   * Reads a file.
   *
   * @throws UserException where it cannot be read or is not a sound case
   */
  public static CaseFile read(Path file) {
    return new CaseReader(file).parse(load(file));
  }

  private static String load(Path file) {
    try {
      if (Files.isDirectory(file)) {
        throw new UserException(file + " is a folder; a case file is expected");
      }
      if (Files.size(file) > LARGEST_BYTES) {
        throw new UserException(file + " is too large to be a case file (over 1 MB)");
      }
      byte[] bytes = Files.readAllBytes(file);
      String text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
      String head = text.stripLeading();
      if (head.startsWith("ISO-10303-21")) {
        throw new UserException(
            file + " is a STEP model, not a case file; write one with: edgefield draft " + file);
      }
      return text;
    } catch (NoSuchFileException e) {
      throw new UserException(
          file + " does not exist; write a case file with: edgefield draft MODEL.step", e);
    } catch (CharacterCodingException e) {
      throw new UserException(file + " is not UTF-8 text; save it as UTF-8", e);
    } catch (IOException e) {
      throw new UserException("cannot read " + file + ": " + reason(e), e);
    }
  }

  private static String reason(IOException e) {
    return e instanceof java.nio.file.AccessDeniedException
        ? "permission denied"
        : String.valueOf(e.getMessage());
  }

  private CaseFile parse(String text) {
    YamlMap top = YamlText.parse(text, problems);
    Optional<Text> model = top.requiredText("model", "model: compartment.step");
    List<ElectrodeEntry> electrodes = electrodes(top);
    List<Text> ignore = top.texts("ignore");
    SurroundingsReader surroundings = new SurroundingsReader(problems);
    CaseFile read =
        new CaseFile(
            file,
            model.map(m -> resolve(m.value())).orElse(file),
            electrodes,
            ignore,
            top.map("surroundings").map(surroundings::read).orElse(SurroundingsReader.standard()),
            top.map("edges").map(this::edges).orElse(edges(null, List.of())),
            duties(top),
            permitted(top),
            mesh(top));
    top.refuseOthers();
    checkVoltages(read);
    problems.throwIfAny();
    return read;
  }

  private Path resolve(String model) {
    Path folder = file.toAbsolutePath().getParent();
    Path path = Path.of(model);
    if (path.isAbsolute()) {
      return path;
    }
    // Kept relative where the case file was named relative, so that messages show short names.
    Path parent = file.getParent();
    return (parent == null ? path : file.isAbsolute() ? folder.resolve(path) : parent.resolve(path))
        .normalize();
  }

  private List<ElectrodeEntry> electrodes(YamlMap top) {
    if (!top.has("electrodes")) {
      problems.add(
          top.place(),
          "the case file needs \"electrodes\", for example"
              + "  electrodes: [{name: phase 1, parts: [\"Busbar L1*\"]}]");
      return List.of();
    }
    List<ElectrodeEntry> electrodes = new ArrayList<>();
    Map<String, Place> seen = new HashMap<>();
    List<YamlMap> maps = top.maps("electrodes", "this electrode");
    for (YamlMap map : maps) {
      Optional<Text> name = map.requiredText("name", "name: phase 1");
      if (!map.has("parts")) {
        problems.add(
            map.place(), "this electrode needs \"parts\", for example  parts: [\"Busbar L1*\"]");
      }
      List<Text> parts = map.texts("parts");
      if (map.has("parts") && parts.isEmpty() && problems.isEmpty()) {
        problems.add(map.placeOf("parts"), "\"parts\" is empty: name at least one part");
      }
      boolean earth = map.flag("earth");
      boolean floating = map.flag("floating");
      if (earth && floating) {
        problems.add(map.place(), "an electrode is either on earth or floating, not both");
      }
      map.refuseOthers();
      if (name.isEmpty()) {
        continue;
      }
      Place first = seen.putIfAbsent(name.get().value(), name.get().place());
      if (first != null) {
        problems.add(
            name.get().place(),
            "electrode \"" + name.get().value() + "\" is already defined at " + first);
      }
      electrodes.add(
          new ElectrodeEntry(
              name.get(),
              parts,
              earth
                  ? Electrode.Kind.EARTH
                  : floating ? Electrode.Kind.FLOATING : Electrode.Kind.LIVE));
    }
    if (maps.isEmpty() && problems.isEmpty()) {
      problems.add(top.placeOf("electrodes"), "\"electrodes\" is empty: at least one is needed");
    }
    return electrodes;
  }

  private EdgesEntry edges(YamlMap map) {
    Optional<Text> radius = map.text("radius as made");
    List<PartRadius> perPart = new ArrayList<>();
    map.map("per part")
        .ifPresent(
            parts ->
                parts
                    .names()
                    .forEach(
                        (pattern, value) ->
                            radius(value).ifPresent(r -> perPart.add(new PartRadius(pattern, r)))));
    map.refuseOthers();
    return edges(radius.flatMap(this::radius).orElse(null), perPart);
  }

  private static EdgesEntry edges(Double radius_m, List<PartRadius> perPart) {
    return radius_m == null
        ? new EdgesEntry(DEFAULT_EDGE_M, false, perPart)
        : new EdgesEntry(radius_m, true, perPart);
  }

  private Optional<Double> radius(Text text) {
    try {
      double least = LengthBand.parse(text.value()).least_m();
      if (least >= 1e-6 && least <= 1) {
        return Optional.of(least);
      }
      problems.add(text.place(), "an edge radius lies between 1 um and 1 m, not " + text.value());
    } catch (QuantityException e) {
      problems.add(text.place(), "edge radius: " + e.getMessage());
    }
    return Optional.empty();
  }

  private List<DutyEntry> duties(YamlMap top) {
    if (!top.has("duties")) {
      problems.add(
          top.place(),
          "the case file needs \"duties\", for example"
              + "  duties: [{name: service, voltages: {phase 1: 10 kV}}]");
      return List.of();
    }
    List<DutyEntry> duties = new ArrayList<>();
    Map<String, Place> seen = new HashMap<>();
    List<YamlMap> maps = top.maps("duties", "this duty");
    for (YamlMap map : maps) {
      Optional<Text> name = map.requiredText("name", "name: service");
      List<VoltageEntry> voltages = new ArrayList<>();
      map.map("voltages")
          .ifPresent(
              v ->
                  v.names()
                      .forEach(
                          (electrode, value) ->
                              voltage(value)
                                  .ifPresent(p -> voltages.add(new VoltageEntry(electrode, p)))));
      map.refuseOthers();
      if (name.isEmpty()) {
        continue;
      }
      Place first = seen.putIfAbsent(name.get().value(), name.get().place());
      if (first != null) {
        problems.add(
            name.get().place(),
            "duty \"" + name.get().value() + "\" is already defined at " + first);
      }
      duties.add(new DutyEntry(name.get().value(), map.place(), voltages));
    }
    if (maps.isEmpty() && problems.isEmpty()) {
      problems.add(top.placeOf("duties"), "\"duties\" is empty: at least one is needed");
    }
    return duties;
  }

  private Optional<Phasor> voltage(Text text) {
    try {
      return Optional.of(Phasor.parse(text.value()));
    } catch (QuantityException e) {
      problems.add(text.place(), e.getMessage());
      return Optional.empty();
    }
  }

  private void checkVoltages(CaseFile read) {
    if (!problems.isEmpty()) {
      return;
    }
    Map<String, Electrode.Kind> kinds = new HashMap<>();
    read.electrodes().forEach(e -> kinds.put(e.name().value(), e.kind()));
    boolean ambient = read.surroundings().ambientField_V_per_m() != null;
    for (DutyEntry duty : read.duties()) {
      List<String> missing = new ArrayList<>();
      for (ElectrodeEntry e : read.electrodes()) {
        if (e.kind() == Electrode.Kind.LIVE
            && duty.voltages().stream()
                .noneMatch(v -> v.electrode().value().equals(e.name().value()))) {
          missing.add('"' + e.name().value() + '"');
        }
      }
      for (VoltageEntry v : duty.voltages()) {
        checkVoltage(v, kinds);
      }
      if (!missing.isEmpty()) {
        problems.add(
            duty.place(),
            String.format(
                Locale.ROOT,
                "duty \"%s\" gives no voltage for %s; add it, or mark the electrode earth: true or"
                    + " floating: true",
                duty.name(),
                String.join(", ", missing)));
      } else if (!ambient && duty.voltages().stream().allMatch(v -> v.voltage().peak_V() == 0)) {
        problems.add(
            duty.place(),
            "duty \""
                + duty.name()
                + "\" has no voltage at all, so there is no field; give one, or an ambient field");
      }
    }
  }

  private void checkVoltage(VoltageEntry v, Map<String, Electrode.Kind> kinds) {
    String name = v.electrode().value();
    Electrode.Kind kind = kinds.get(name);
    if (kind == null) {
      String hint =
          Nearest.to(name, kinds.keySet())
              .map(n -> "; did you mean \"" + n + "\"?")
              .orElse(
                  "; electrodes: " + String.join(", ", kinds.keySet().stream().sorted().toList()));
      problems.add(v.electrode().place(), "there is no electrode \"" + name + '"' + hint);
    } else if (kind == Electrode.Kind.EARTH && v.voltage().peak_V() != 0) {
      problems.add(v.electrode().place(), "electrode \"" + name + "\" is earth: it has no voltage");
    } else if (kind == Electrode.Kind.FLOATING) {
      problems.add(
          v.electrode().place(),
          "electrode \"" + name + "\" is floating: its voltage follows from the others");
    }
  }

  private Permitted permitted(YamlMap top) {
    Optional<YamlMap> found = top.map("permitted");
    if (found.isEmpty()) {
      return new Permitted(Permitted.Criterion.FIXED, DEFAULT_FIELD_V_PER_M, 1, 0.8, 1);
    }
    YamlMap map = found.get();
    Permitted.Criterion criterion =
        map.word("criterion", List.of("fixed", "peek", "streamer"))
            .map(w -> Permitted.Criterion.valueOf(w.toUpperCase(Locale.ROOT)))
            .orElse(Permitted.Criterion.FIXED);
    if (criterion != Permitted.Criterion.FIXED && map.has("field")) {
      problems.add(
          map.placeOf("field"),
          "\"field\" belongs to criterion fixed; here the law sets the field");
    }
    Permitted permitted =
        new Permitted(
            criterion,
            map.quantity(
                "field",
                Dimension.FIELD,
                1e3,
                1e9,
                "between 1 kV/m and 1000 kV/mm",
                DEFAULT_FIELD_V_PER_M),
            map.quantity("margin", Dimension.RATIO, 0.1, 100, "between 0.1 and 100", 1),
            map.quantity("amber", Dimension.RATIO, 0.01, 1, "between 0.01 and 1", 0.8),
            map.quantity("roughness", Dimension.RATIO, 0.1, 1, "between 0.1 and 1", 1));
    map.refuseOthers();
    return permitted;
  }

  private MeshSettings mesh(YamlMap top) {
    MeshSettings standard = MeshSettings.defaults();
    Optional<YamlMap> found = top.map("mesh");
    if (found.isEmpty()) {
      return standard;
    }
    YamlMap map = found.get();
    MeshSettings settings =
        new MeshSettings(
            map.quantity(
                "elements per 90 degrees",
                Dimension.RATIO,
                1,
                64,
                "between 1 and 64",
                standard.elementsPer90Degrees()),
            map.quantity(
                "aspect", Dimension.RATIO, 1, 20, "between 1 and 20", standard.maxAspect()),
            map.quantity(
                "largest size",
                Dimension.LENGTH,
                1e-6,
                1e3,
                "between 1 um and 1 km",
                standard.maxSize_m()),
            standard.maxSizeFraction(),
            map.quantity(
                "elements per gap",
                Dimension.RATIO,
                0,
                20,
                "between 0 and 20",
                standard.elementsPerGap()),
            standard.grading());
    map.refuseOthers();
    return settings;
  }
}
