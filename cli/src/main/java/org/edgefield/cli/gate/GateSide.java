package org.edgefield.cli.gate;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.StreamSupport;

/**
 * One side of a comparison, read from result.json or from an accepted file: both carry the same
 * keys.
 *
 * @param method screen or solve
 * @param conditions limits, surroundings and edges as written
 * @param voltages voltages as written, by duty
 * @param duties hot spots by duty, in file order
 */
record GateSide(
    String method,
    JsonNode conditions,
    Map<String, JsonNode> voltages,
    Map<String, List<GateSpot>> duties) {

  /**
   * Reads a side.
   *
   * @throws IllegalArgumentException where a key is missing or of another kind; names the key
   */
  static GateSide from(JsonNode root) {
    Map<String, JsonNode> voltages = new LinkedHashMap<>();
    Map<String, List<GateSpot>> duties = new LinkedHashMap<>();
    for (JsonNode duty : array(root, "duties")) {
      String name = text(duty, "name");
      voltages.put(name, required(duty, "voltages"));
      duties.put(name, stream(array(duty, "hot_spots")).map(GateSide::spot).toList());
    }
    return new GateSide(text(root, "method"), required(root, "conditions"), voltages, duties);
  }

  private static GateSpot spot(JsonNode node) {
    JsonNode extent = required(node, "extent");
    double[] points = numbers(extent, "points_m");
    double[] at = numbers(node, "at_m");
    if (at.length != 3 || points.length < 3 || points.length % 3 != 0) {
      throw new IllegalArgumentException("\"at_m\" and \"points_m\" hold triples of coordinates");
    }
    return new GateSpot(
        text(node, "part"),
        text(node, "part_path"),
        text(node, "feature"),
        at,
        number(node, "utilisation"),
        text(node, "state").equals("red"),
        points,
        number(extent, "spacing_m"));
  }

  private static JsonNode required(JsonNode node, String key) {
    JsonNode value = node.get(key);
    if (value == null) {
      throw new IllegalArgumentException("\"" + key + "\" is missing");
    }
    return value;
  }

  private static JsonNode array(JsonNode node, String key) {
    JsonNode value = required(node, key);
    if (!value.isArray()) {
      throw new IllegalArgumentException("\"" + key + "\" must be a list");
    }
    return value;
  }

  private static String text(JsonNode node, String key) {
    JsonNode value = required(node, key);
    if (!value.isTextual()) {
      throw new IllegalArgumentException("\"" + key + "\" must be a text");
    }
    return value.textValue();
  }

  private static double number(JsonNode node, String key) {
    JsonNode value = required(node, key);
    if (!value.isNumber()) {
      throw new IllegalArgumentException("\"" + key + "\" must be a number");
    }
    return value.doubleValue();
  }

  private static double[] numbers(JsonNode node, String key) {
    return stream(array(node, key)).mapToDouble(JsonNode::doubleValue).toArray();
  }

  private static java.util.stream.Stream<JsonNode> stream(JsonNode array) {
    return StreamSupport.stream(array.spliterator(), false);
  }
}
