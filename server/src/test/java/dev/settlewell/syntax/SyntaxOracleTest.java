package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.SourceText;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.yaml.snakeyaml.DumperOptions;
import org.yaml.snakeyaml.DumperOptions.FlowStyle;
import org.yaml.snakeyaml.DumperOptions.ScalarStyle;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.Yaml;
import org.yaml.snakeyaml.constructor.SafeConstructor;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.nodes.MappingNode;
import org.yaml.snakeyaml.nodes.Node;
import org.yaml.snakeyaml.nodes.NodeTuple;
import org.yaml.snakeyaml.nodes.ScalarNode;
import org.yaml.snakeyaml.nodes.SequenceNode;
import org.yaml.snakeyaml.representer.Representer;

/**
 * What is good YAML is never taken for a slip: texts written by a YAML writer in all its styles are
 * read without a problem, and as a YAML reader composes them.
 */
class SyntaxOracleTest {
  private static final int SEEDS = Integer.getInteger("seeds", 1500);

  private static final String[] TEXTS = {
    "4.7 kΩ ±1 %",
    "-40 °C",
    "±2 mV",
    "a",
    "it's",
    "Rev C: x",
    "see #12",
    "x # y",
    "[draft] x",
    "{a: 1}",
    "- 1 V",
    "-1",
    "*x*",
    "&x y",
    "!urgent",
    "@x",
    "> 5 V",
    "| x",
    "% of",
    "? x",
    ": x",
    "x:",
    "",
    " lead",
    "trail ",
    "two\nlines",
    "two\n\nlines\n",
    "\tx",
    "a\ttab",
    "\"quoted\" x",
    "'single' x",
    "a, b",
    "4,7",
    "null",
    "~",
    "on",
    "1:30",
    "😀 😀",
    "http://host/p?q#r",
    "--- x",
    "...",
    "<<",
    "=",
    "a \\ b",
    "\\",
    "long long long long long text that is folded, twice: or so",
    "[",
    "]",
    "{",
    "}",
    ",",
    "#",
    "\"",
    "'",
    "|",
    ">-"
  };
  private static final String[] KEYS = {
    "a", "about", "because", "path", "upper", "r25", "2", "3", "some-key", "a: b", "#k", "[k]", "on"
  };

  @Test
  void whatAWriterWritesIsReadAsAReaderReadsIt() {
    int unreadable = 0;
    for (int seed = 0; seed < SEEDS; seed++) {
      Random random = new Random(seed);
      String written =
          new Yaml(
                  new SafeConstructor(new LoaderOptions()),
                  new Representer(style(random)),
                  style(new Random(seed)))
              .dump(mapping(random, 3));
      Node composed;
      try {
        composed = new Yaml().compose(new StringReader(written));
      } catch (YAMLException e) {
        unreadable++; // the writer's explicit indentations are not always right
        continue;
      }
      SourceText text = SourceText.of("s", written);
      SyntaxTree tree = Syntax.parse(text);
      assertThat(tree.problems()).as("seed %d:%n%s", seed, written).isEmpty();
      assertThat(Shown.values(tree.root()))
          .as("seed %d:%n%s", seed, written)
          .isEqualTo(shown(composed));
    }
    assertThat(unreadable).isLessThan(SEEDS / 50);
  }

  private static DumperOptions style(Random random) {
    DumperOptions options = new DumperOptions();
    options.setDefaultFlowStyle(FlowStyle.values()[random.nextInt(FlowStyle.values().length)]);
    ScalarStyle[] scalars = {
      ScalarStyle.PLAIN,
      ScalarStyle.SINGLE_QUOTED,
      ScalarStyle.DOUBLE_QUOTED,
      ScalarStyle.LITERAL,
      ScalarStyle.FOLDED
    };
    options.setDefaultScalarStyle(scalars[random.nextInt(scalars.length)]);
    int indent = 2 + random.nextInt(4);
    options.setIndent(indent);
    options.setIndicatorIndent(random.nextInt(indent - 1));
    options.setIndentWithIndicator(random.nextBoolean());
    options.setWidth(30 + random.nextInt(60));
    options.setPrettyFlow(random.nextBoolean());
    options.setExplicitStart(random.nextInt(5) == 0);
    options.setExplicitEnd(random.nextInt(8) == 0);
    options.setSplitLines(random.nextBoolean());
    options.setAllowUnicode(random.nextInt(4) > 0);
    options.setLineBreak(
        random.nextBoolean() ? DumperOptions.LineBreak.UNIX : DumperOptions.LineBreak.WIN);
    return options;
  }

  private static Map<String, Object> mapping(Random random, int depth) {
    Map<String, Object> mapping = new LinkedHashMap<>();
    for (int i = random.nextInt(4) + (depth == 3 ? 1 : 0); i > 0; i--) {
      mapping.put(KEYS[random.nextInt(KEYS.length)], value(random, depth - 1));
    }
    return mapping;
  }

  private static Object value(Random random, int depth) {
    int kind = depth == 0 ? 0 : random.nextInt(4);
    if (kind == 1) {
      return mapping(random, depth);
    }
    if (kind == 2) {
      List<Object> list = new ArrayList<>();
      for (int i = random.nextInt(4); i > 0; i--) {
        list.add(value(random, depth - 1));
      }
      return list;
    }
    return TEXTS[random.nextInt(TEXTS.length)];
  }

  private static String shown(Node node) {
    if (node instanceof ScalarNode scalar) {
      return scalar.getValue();
    }
    List<String> parts = new ArrayList<>();
    if (node instanceof SequenceNode list) {
      list.getValue().forEach(item -> parts.add(shown(item)));
      return parts.toString();
    }
    for (NodeTuple entry : ((MappingNode) node).getValue()) {
      parts.add(shown(entry.getKeyNode()) + ": " + shown(entry.getValueNode()));
    }
    return "{" + String.join(", ", parts) + "}";
  }
}
