package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.SourceText;
import org.junit.jupiter.api.Test;

/** The line that names a block is gone: the block costs itself, what follows is read. */
class NamelessBlockTest {
  private static SyntaxTree parse(String text) {
    return Syntax.parse(SourceText.of("a.channels.yaml", text));
  }

  private static Node.Mapping channels(SyntaxTree tree) {
    return tree.root().entries().stream()
        .filter(entry -> entry.key().text().equals("channels"))
        .map(entry -> (Node.Mapping) entry.value())
        .findFirst()
        .orElseThrow();
  }

  @Test
  void theNamesThatFollowAreRead() {
    String text =
        """
        channels:
            measures: 0 V to 1 V
            path:
              - resistor: 1 kΩ
          pump:
            measures: 0 V to 2 V
          fan:
            measures: 0 V to 3 V
        """;
    SyntaxTree tree = parse(text);
    assertThat(channels(tree).entries())
        .extracting(entry -> entry.key().text())
        .containsExactly("pump", "fan");
    assertThat(tree.problems()).hasSize(1);
    assertThat(tree.problems().get(0).message()).contains("the line that names this is missing");
    assertThat(tree.text().slice(tree.problems().get(0).place().span()))
        .isEqualTo("measures: 0 V to 1 V");
  }

  @Test
  void oneNameInTheWrongColumnStaysAName() {
    String text =
        """
        channels:
            pump:
              measures: 0 V to 2 V
          fan:
              measures: 0 V to 3 V
            door:
              measures: 0 V to 1 V
        """;
    assertThat(channels(parse(text)).entries())
        .extracting(entry -> entry.key().text())
        .contains("pump", "fan", "door");
  }
}
