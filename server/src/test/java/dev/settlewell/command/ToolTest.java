package dev.settlewell.command;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.finding.Check;
import dev.settlewell.finding.catalog.Catalog;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ToolTest {
  @TempDir private Path folder;

  @Test
  void tellsItsVersion() {
    assertThat(Typed.in(folder, "--version")).isEqualTo(new Typed(0, "settlewell 0.1.0\n", ""));
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "check", "figures", "trials", "explain", "serve", "mend", "compare"})
  void everyHelpFitsATerminalAndHasAnExample(String command) {
    Typed typed = Typed.in(folder, (command + " --help").trim().split(" "));
    assertThat(typed.code()).isZero();
    assertThat(typed.out()).contains("Example").contains("Usage: settlewell " + command);
    assertThat(typed.out().lines()).allMatch(line -> line.length() <= 80);
  }

  @Test
  void wrongUsageIsToldWithTheNearestWord() {
    Typed command = Typed.in(folder, "chek");
    assertThat(command.code()).isEqualTo(2);
    assertThat(command.out()).isEmpty();
    assertThat(command.err()).startsWith("settlewell: no command chek; did you mean check?\n");
    Typed option = Typed.in(folder, "check", "--formt=json");
    assertThat(option.code()).isEqualTo(2);
    assertThat(option.err())
        .startsWith("settlewell: no option --formt=json; did you mean --format");
    Typed nothing = Typed.in(folder);
    assertThat(nothing.code()).isEqualTo(2);
    assertThat(nothing.err()).startsWith("settlewell: a command is missing\n");
  }

  @Test
  void explainsEveryFinding() {
    for (String name : Catalog.CHECKS.stream().map(Check::name).toList()) {
      Typed typed = Typed.in(folder, "explain", name);
      assertThat(typed.code()).as("%s: %s", name, typed.err()).isZero();
      assertThat(typed.out()).startsWith("# " + name + "\n").contains("How to mend it");
    }
    assertThat(Typed.in(folder, "explain").out())
        .contains("acquisition-too-short (error)\n")
        .contains("not-computed (hint)\n");
    Typed typo = Typed.in(folder, "explain", "acquisiton-too-short");
    assertThat(typo.code()).isEqualTo(2);
    assertThat(typo.err()).contains("did you mean acquisition-too-short?");
  }

  @Test
  void figuresFitATerminalAndTellWhatTheyRestOn() throws IOException {
    Files.writeString(folder.resolve("mast.channels.yaml"), Boards.CLEAN);
    Typed typed = Typed.in(folder, "figures", "--derivations");
    assertThat(typed.code()).isZero();
    assertThat(typed.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
    // 12 bits of 2.5 V: 2.5 V / 4096.
    assertThat(typed.out()).containsPattern("  lsb +610 µV\n    = \\(high - low\\) / 2\\^bits\n");
    Typed other = Typed.in(folder, "figures", "--channel", "heatr");
    assertThat(other.code()).isEqualTo(2);
    assertThat(other.err()).contains("no channel heatr; did you mean heater?");
  }
}
