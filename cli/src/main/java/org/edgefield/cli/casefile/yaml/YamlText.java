package org.edgefield.cli.casefile.yaml;

import java.io.StringReader;
import org.edgefield.cli.UserException;
import org.yaml.snakeyaml.DumperOptions.FlowStyle;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.Yaml;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.MarkedYAMLException;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.nodes.MappingNode;
import org.yaml.snakeyaml.nodes.Node;
import org.yaml.snakeyaml.nodes.Tag;

/** Reads YAML into nodes that know their line and column; no objects are built from tags. */
public final class YamlText {
  private YamlText() {}

  /**
   * The mapping at the top of a text.
   *
   * @param text YAML, one document
   * @param problems takes what is wrong; unreadable YAML ends the run at once
   */
  public static YamlMap parse(String text, Problems problems) {
    Node root;
    try {
      LoaderOptions options = new LoaderOptions();
      options.setNestingDepthLimit(50);
      root = new Yaml(options).compose(new StringReader(text));
    } catch (MarkedYAMLException e) {
      Mark mark = e.getProblemMark() == null ? e.getContextMark() : e.getProblemMark();
      String context = e.getContext() == null ? "" : e.getContext() + ": ";
      problems.add(place(mark), "not readable as YAML: " + context + e.getProblem());
      problems.throwIfAny();
      throw e;
    } catch (YAMLException e) {
      throw new UserException("not readable as YAML: " + e.getMessage(), e);
    }
    if (root == null) {
      root =
          new MappingNode(Tag.MAP, true, new java.util.ArrayList<>(), null, null, FlowStyle.BLOCK);
    }
    return YamlMap.of(root, "the case file", problems);
  }

  static Place place(Node node) {
    return place(node.getStartMark());
  }

  private static Place place(Mark mark) {
    return mark == null ? new Place(1, 1) : new Place(mark.getLine() + 1, mark.getColumn() + 1);
  }
}
