package org.edgefield.cli.gate;

import java.util.List;
import java.util.Map;

/**
 * Writes a comparison as a JUnit-style XML report, which build servers show: a test per hot spot.
 */
final class JunitXml {
  private JunitXml() {}

  static String text(Comparison comparison) {
    StringBuilder xml = new StringBuilder("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n");
    xml.append("<testsuites name=\"edgefield gate\">\n");
    conditions(comparison.changedConditions(), xml);
    for (Map.Entry<String, List<GateFinding>> duty : comparison.findings().entrySet()) {
      List<GateFinding> findings = duty.getValue();
      xml.append("  <testsuite name=\"").append(escape(duty.getKey())).append('"');
      xml.append(" tests=\"").append(Math.max(1, findings.size())).append('"');
      xml.append(" failures=\"").append(findings.stream().filter(GateFinding::fails).count());
      xml.append("\">\n");
      if (findings.isEmpty()) {
        xml.append("    <testcase classname=\"").append(escape(duty.getKey()));
        xml.append("\" name=\"no hot spots\"/>\n");
      }
      for (GateFinding f : findings) {
        testCase(duty.getKey(), f, xml);
      }
      xml.append("  </testsuite>\n");
    }
    return xml.append("</testsuites>\n").toString();
  }

  private static void conditions(List<String> changes, StringBuilder xml) {
    if (changes.isEmpty()) {
      return;
    }
    xml.append("  <testsuite name=\"conditions\" tests=\"").append(changes.size());
    xml.append("\" failures=\"").append(changes.size()).append("\">\n");
    for (String change : changes) {
      xml.append("    <testcase classname=\"conditions\" name=\"").append(escape(change));
      xml.append("\">\n      <failure message=\"differs from the accepted result\"/>\n");
      xml.append("    </testcase>\n");
    }
    xml.append("  </testsuite>\n");
  }

  private static void testCase(String duty, GateFinding f, StringBuilder xml) {
    String words =
        f.change().key()
            + ": utilisation "
            + GateText.use(f.now())
            + ", accepted "
            + GateText.use(f.accepted());
    xml.append("    <testcase classname=\"").append(escape(duty));
    xml.append("\" name=\"").append(escape(f.spot().feature() + " of " + f.spot().part()));
    if (f.fails()) {
      xml.append("\">\n      <failure message=\"").append(escape(words)).append("\"/>\n");
      xml.append("    </testcase>\n");
    } else {
      xml.append("\">\n      <system-out>").append(escape(words)).append("</system-out>\n");
      xml.append("    </testcase>\n");
    }
  }

  private static String escape(String text) {
    StringBuilder out = new StringBuilder();
    text.codePoints()
        .forEach(
            c -> {
              switch (c) {
                case '&' -> out.append("&amp;");
                case '<' -> out.append("&lt;");
                case '>' -> out.append("&gt;");
                case '"' -> out.append("&quot;");
                default -> out.appendCodePoint(c < ' ' ? ' ' : c);
              }
            });
    return out.toString();
  }
}
