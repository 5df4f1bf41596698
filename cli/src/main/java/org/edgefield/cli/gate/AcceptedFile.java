package org.edgefield.cli.gate;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import org.edgefield.cli.UserException;
import org.edgefield.cli.report.ResultJson;

/**
 * The accepted result: the part of result.json that the gate needs, as accepted.schema.json says.
 */
final class AcceptedFile {
  /** Value of the key {@code format}. */
  static final String FORMAT = "edgefield-accepted-1";

  private static final ObjectMapper JSON =
      JsonMapper.builder().enable(DeserializationFeature.USE_BIG_DECIMAL_FOR_FLOATS).build();
  private static final List<String> TOP = List.of("tool", "input", "method", "conditions");
  private static final List<String> SPOT =
      List.of(
          "state",
          "part",
          "part_path",
          "feature",
          "at_m",
          "field_V_per_m",
          "permitted_V_per_m",
          "utilisation",
          "extent");

  private AcceptedFile() {}

  /** Reads the text of a result.json that this tool wrote. */
  static JsonNode tree(String resultJson) {
    try {
      return JSON.readTree(resultJson);
    } catch (JsonProcessingException e) {
      throw new IllegalArgumentException(e);
    }
  }

  /** The accepted file's text for a result. */
  static String text(JsonNode result) {
    ObjectNode root = JSON.createObjectNode();
    root.put("format", FORMAT);
    TOP.forEach(key -> root.set(key, result.get(key)));
    ArrayNode duties = root.putArray("duties");
    for (JsonNode duty : result.get("duties")) {
      ObjectNode kept = duties.addObject();
      kept.set("name", duty.get("name"));
      kept.set("voltages", duty.get("voltages"));
      ArrayNode spots = kept.putArray("hot_spots");
      for (JsonNode spot : duty.get("hot_spots")) {
        ObjectNode slim = spots.addObject();
        SPOT.forEach(key -> slim.set(key, spot.get(key)));
      }
    }
    DefaultPrettyPrinter printer =
        new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n"));
    try {
      return JSON.writer(printer).writeValueAsString(root) + "\n";
    } catch (JsonProcessingException e) {
      throw new IllegalStateException(e);
    }
  }

  /**
   * Reads an accepted file; a result.json serves as well.
   *
   * @throws UserException where it is missing, unreadable or something else
   */
  static GateSide read(Path file) {
    try {
      JsonNode root = JSON.readTree(Files.readAllBytes(file));
      String format = root.path("format").asText("");
      if (!format.equals(FORMAT) && !format.equals(ResultJson.FORMAT)) {
        throw new UserException(
            file
                + " is no accepted result of this tool (\"format\" is not "
                + FORMAT
                + "); write one with --accept to another file name");
      }
      return GateSide.from(root);
    } catch (NoSuchFileException e) {
      throw new UserException(
          file + " does not exist; look at the result, then write it with --accept", e);
    } catch (JsonProcessingException e) {
      throw new UserException(
          file
              + ":"
              + e.getLocation().getLineNr()
              + ":"
              + e.getLocation().getColumnNr()
              + ": not readable as JSON; restore it or write it anew with --accept",
          e);
    } catch (IllegalArgumentException e) {
      throw new UserException(
          file + ": " + e.getMessage() + "; restore it or write it anew with --accept", e);
    } catch (IOException e) {
      throw new UserException("cannot read " + file + ": " + e.getMessage(), e);
    }
  }
}
