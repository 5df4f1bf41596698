package org.edgefield.cli.casefile.yaml;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.edgefield.cli.casefile.Nearest;
import org.edgefield.cli.casefile.units.Dimension;
import org.edgefield.cli.casefile.units.Quantities;
import org.edgefield.cli.casefile.units.QuantityException;
import org.yaml.snakeyaml.nodes.MappingNode;
import org.yaml.snakeyaml.nodes.Node;
import org.yaml.snakeyaml.nodes.NodeTuple;
import org.yaml.snakeyaml.nodes.ScalarNode;
import org.yaml.snakeyaml.nodes.SequenceNode;
import org.yaml.snakeyaml.nodes.Tag;

/**
 * A mapping of the case file. Reads its keys with their types; every wrong type, wrong unit,
 * missing, doubled or unknown key becomes a problem at its line and column, and the reader gets an
 * empty answer.
 */
public final class YamlMap {
  private final String what;
  private final Place place;
  private final Problems problems;
  private final Map<String, Entry> entries = new LinkedHashMap<>();
  private final Set<String> asked = new TreeSet<>();

  private YamlMap(String what, Place place, Problems problems) {
    this.what = what;
    this.place = place;
    this.problems = problems;
  }

  static YamlMap of(Node node, String what, Problems problems) {
    YamlMap map = new YamlMap(what, YamlText.place(node), problems);
    if (!(node instanceof MappingNode mapping)) {
      problems.add(map.place, what + " must be a mapping of keys to values");
      return map;
    }
    for (NodeTuple tuple : mapping.getValue()) {
      if (!(tuple.getKeyNode() instanceof ScalarNode key)) {
        problems.add(YamlText.place(tuple.getKeyNode()), "a key must be a plain word");
        continue;
      }
      Text name = new Text(key.getValue(), YamlText.place(key));
      if (map.entries.putIfAbsent(name.value(), new Entry(name, tuple.getValueNode())) != null) {
        problems.add(name.place(), quoted(name.value()) + " is given twice in " + what);
      }
    }
    return map;
  }

  /** Where the mapping starts. */
  public Place place() {
    return place;
  }

  /** Where a key stands, or the mapping where it is absent. */
  public Place placeOf(String key) {
    Entry entry = entries.get(key);
    return entry == null ? place : entry.key().place();
  }

  /** Whether a key is there. */
  public boolean has(String key) {
    asked.add(key);
    return entries.containsKey(key);
  }

  /** A text. */
  public Optional<Text> text(String key) {
    return node(key).flatMap(n -> scalar(n, quoted(key)));
  }

  /** A text that must be there. */
  public Optional<Text> requiredText(String key, String example) {
    if (!has(key)) {
      problems.add(place, what + " needs " + quoted(key) + ", for example  " + example);
    }
    return text(key);
  }

  /** A yes or no; false where absent. */
  public boolean flag(String key) {
    Optional<Text> text = text(key);
    if (text.isEmpty()) {
      return false;
    }
    String value = text.get().value();
    if (!value.equals("true") && !value.equals("false")) {
      problems.add(text.get().place(), quoted(key) + " must be true or false, not " + value);
    }
    return value.equals("true");
  }

  /** A quantity in SI units within bounds; the bounds' text says what is sound, in the message. */
  public double quantity(
      String key, Dimension dimension, double least, double most, String bounds, double absent) {
    Optional<Text> text = text(key);
    if (text.isEmpty()) {
      return absent;
    }
    try {
      double value = Quantities.parse(text.get().value(), dimension);
      if (value >= least && value <= most) {
        return value;
      }
      problems.add(
          text.get().place(), quoted(key) + " must be " + bounds + ", not " + text.get().value());
    } catch (QuantityException e) {
      problems.add(text.get().place(), quoted(key) + ": " + e.getMessage());
    }
    return absent;
  }

  /** One of a few words. */
  public Optional<String> word(String key, List<String> words) {
    Optional<Text> text = text(key);
    if (text.isEmpty() || words.contains(text.get().value())) {
      return text.map(Text::value);
    }
    String hint =
        Nearest.to(text.get().value(), words).map(w -> "; did you mean " + w + "?").orElse("");
    problems.add(
        text.get().place(),
        quoted(key)
            + " must be "
            + String.join(", ", words.subList(0, words.size() - 1))
            + " or "
            + words.get(words.size() - 1)
            + ", not "
            + quoted(text.get().value())
            + hint);
    return Optional.empty();
  }

  /** A mapping under a key. */
  public Optional<YamlMap> map(String key) {
    return node(key).map(n -> of(n, quoted(key), problems));
  }

  /** A list of texts; a single text counts as a list of one. Empty where absent. */
  public List<Text> texts(String key) {
    List<Text> texts = new ArrayList<>();
    Optional<Node> node = node(key);
    if (node.isEmpty()) {
      return texts;
    }
    if (node.get() instanceof SequenceNode sequence) {
      for (Node item : sequence.getValue()) {
        scalar(item, "an entry of " + quoted(key)).ifPresent(texts::add);
      }
    } else {
      scalar(node.get(), quoted(key)).ifPresent(texts::add);
    }
    return texts;
  }

  /** A list of mappings; empty where absent. */
  public List<YamlMap> maps(String key, String itemWhat) {
    Optional<Node> node = node(key);
    if (node.isEmpty()) {
      return List.of();
    }
    if (!(node.get() instanceof SequenceNode sequence)) {
      problems.add(
          YamlText.place(node.get()),
          quoted(key) + " must be a list: start each entry with \"- \"");
      return List.of();
    }
    return sequence.getValue().stream().map(n -> of(n, itemWhat, problems)).toList();
  }

  /** All entries as texts, for mappings whose keys are names. */
  public Map<Text, Text> names() {
    Map<Text, Text> all = new LinkedHashMap<>();
    for (Entry entry : entries.values()) {
      asked.add(entry.key().value());
      scalar(entry.value(), quoted(entry.key().value()))
          .ifPresent(value -> all.put(entry.key(), value));
    }
    return all;
  }

  /** Turns every key that nobody asked for into a problem. */
  public void refuseOthers() {
    for (Entry entry : entries.values()) {
      String key = entry.key().value();
      if (!asked.contains(key)) {
        String hint =
            Nearest.to(key, asked)
                .map(k -> "; did you mean " + quoted(k) + "?")
                .orElse("; known here: " + String.join(", ", asked));
        problems.add(entry.key().place(), "unknown key " + quoted(key) + " in " + what + hint);
      }
    }
  }

  private Optional<Node> node(String key) {
    asked.add(key);
    Entry entry = entries.get(key);
    if (entry == null) {
      return Optional.empty();
    }
    if (entry.value().getTag().equals(Tag.NULL)) {
      problems.add(entry.key().place(), quoted(key) + " has no value");
      return Optional.empty();
    }
    return Optional.of(entry.value());
  }

  private Optional<Text> scalar(Node node, String name) {
    if (node instanceof ScalarNode scalar && !node.getTag().equals(Tag.NULL)) {
      if (!scalar.getValue().isBlank()) {
        return Optional.of(new Text(scalar.getValue().strip(), YamlText.place(node)));
      }
    }
    if (node instanceof ScalarNode) {
      problems.add(YamlText.place(node), name + " is empty");
    } else {
      problems.add(YamlText.place(node), name + " must be a single value");
    }
    return Optional.empty();
  }

  private static String quoted(String text) {
    return '"' + text + '"';
  }

  private record Entry(Text key, Node value) {}
}
