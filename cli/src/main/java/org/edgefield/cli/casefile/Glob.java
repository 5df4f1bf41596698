package org.edgefield.cli.casefile;

import java.util.regex.Pattern;
import org.edgefield.importer.brep.Part;

/**
 * Pattern for part names: {@code *} stands for any run of characters, {@code ?} for one, {@code \}
 * takes the next character as it is. Tried on the part's name and on its whole instance path; case
 * counts.
 */
public final class Glob {
  private final String text;
  private final Pattern pattern;

  /** Compiles a pattern. */
  public Glob(String text) {
    this.text = text;
    StringBuilder regex = new StringBuilder();
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == '*') {
        regex.append(".*");
      } else if (c == '?') {
        regex.append('.');
      } else {
        if (c == '\\' && i + 1 < text.length()) {
          c = text.charAt(++i);
        }
        regex.append(Pattern.quote(String.valueOf(c)));
      }
    }
    this.pattern = Pattern.compile(regex.toString(), Pattern.DOTALL);
  }

  /** The pattern that matches exactly this name. */
  public static String literal(String name) {
    return name.replaceAll("([*?\\\\])", "\\\\$1");
  }

  /** Whether a part's name or instance path matches. */
  public boolean matches(Part part) {
    return pattern.matcher(part.name()).matches() || pattern.matcher(part.path()).matches();
  }

  /** As written. */
  public String text() {
    return text;
  }
}
