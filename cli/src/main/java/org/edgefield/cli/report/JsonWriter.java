package org.edgefield.cli.report;

import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;

/**
 * Writes JSON with numbers of nine significant digits; NaN and infinity, which JSON cannot hold,
 * become null.
 */
public final class JsonWriter {
  private static final MathContext NINE_DIGITS = new MathContext(9);

  private final JsonGenerator out;

  /** Writes to a generator. */
  public JsonWriter(JsonGenerator out) {
    this.out = out;
  }

  /** Starts an object. */
  public JsonWriter open() throws IOException {
    out.writeStartObject();
    return this;
  }

  /** Starts an object under a key. */
  public JsonWriter open(String key) throws IOException {
    out.writeObjectFieldStart(key);
    return this;
  }

  /** Ends an object. */
  public JsonWriter close() throws IOException {
    out.writeEndObject();
    return this;
  }

  /** Starts an array under a key. */
  public JsonWriter openArray(String key) throws IOException {
    out.writeArrayFieldStart(key);
    return this;
  }

  /** Ends an array. */
  public JsonWriter closeArray() throws IOException {
    out.writeEndArray();
    return this;
  }

  /** Writes a text. */
  public JsonWriter put(String key, String value) throws IOException {
    out.writeStringField(key, value);
    return this;
  }

  /** Writes texts. */
  public JsonWriter put(String key, List<String> values) throws IOException {
    out.writeArrayFieldStart(key);
    for (String value : values) {
      out.writeString(value);
    }
    out.writeEndArray();
    return this;
  }

  /** Writes a yes or no. */
  public JsonWriter put(String key, boolean value) throws IOException {
    out.writeBooleanField(key, value);
    return this;
  }

  /** Writes an integer. */
  public JsonWriter put(String key, int value) throws IOException {
    out.writeNumberField(key, value);
    return this;
  }

  /** Writes a number. */
  public JsonWriter put(String key, double value) throws IOException {
    out.writeFieldName(key);
    number(value);
    return this;
  }

  /** Writes a number unless it is NaN. */
  public JsonWriter putIfNumber(String key, double value) throws IOException {
    return Double.isNaN(value) ? this : put(key, value);
  }

  /** Writes an array of numbers under a key. */
  public JsonWriter numbers(String key, double[] values) throws IOException {
    out.writeFieldName(key);
    return numbers(values);
  }

  /** Writes an array of numbers. */
  public JsonWriter numbers(double[] values) throws IOException {
    out.writeStartArray();
    for (double value : values) {
      number(value);
    }
    out.writeEndArray();
    return this;
  }

  private void number(double value) throws IOException {
    if (!Double.isFinite(value)) {
      out.writeNull();
    } else if (value == Math.rint(value) && Math.abs(value) < 1e9) {
      out.writeNumber((long) value);
    } else {
      // Through text, so that every Java version writes the same digits.
      double rounded = new BigDecimal(value).round(NINE_DIGITS).doubleValue();
      out.writeNumber(new BigDecimal(Double.toString(rounded)).toString());
    }
  }
}
