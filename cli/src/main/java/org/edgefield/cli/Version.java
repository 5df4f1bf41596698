package org.edgefield.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** The version the build gave this tool. */
public final class Version {
  /** Name of the tool as results carry it. */
  public static final String TOOL = "edgefield";

  private Version() {}

  /** For example "0.1.0". */
  public static String number() {
    try (InputStream in = Version.class.getResourceAsStream("version.properties")) {
      Properties properties = new Properties();
      properties.load(in);
      return properties.getProperty("version");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
