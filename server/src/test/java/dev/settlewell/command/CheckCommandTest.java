package dev.settlewell.command;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CheckCommandTest {
  private static final String ESCAPE = "\u001b[";

  @TempDir private Path folder;

  @BeforeEach
  void write() throws IOException {
    Files.createDirectories(folder.resolve("boards"));
    write("boards/clean.channels.yaml", Boards.CLEAN);
    write("boards/hasty.channels.yaml", Boards.HASTY);
  }

  private void write(String name, String text) throws IOException {
    Files.writeString(folder.resolve(name), text);
  }

  @Test
  void aCleanSheetIsToldInOneLine() {
    Typed typed = Typed.in(folder, "check", "boards/clean.channels.yaml");
    assertThat(typed).isEqualTo(new Typed(0, "no findings in 1 sheet\n", ""));
  }

  @Test
  void marksTheExactValueAndTellsTheFigures() {
    Typed typed = Typed.in(folder, "check", "boards/hasty.channels.yaml");
    assertThat(typed.code()).isEqualTo(1);
    assertThat(typed.out())
        .contains("boards/hasty.channels.yaml:27:18 error acquisition-too-short\n")
        .contains("    acquisition: 2 cycles\n                 ^^^^^^^^\n")
        .containsPattern("\n    need +\\S.*\n");
  }

  @Test
  void searchesThePresentFolderAndOrdersByPath() throws IOException {
    write("a.channels.yaml", Boards.HASTY);
    write("boards/notes.yaml", "no sheet");
    Typed typed = Typed.in(folder, "check");
    assertThat(typed.out()).contains(" in 3 sheets");
    assertThat(typed.out().indexOf("a.channels.yaml:"))
        .isLessThan(typed.out().indexOf("boards/hasty.channels.yaml:"));
  }

  @Test
  void failsOnlyFromTheSeverityThatIsAskedFor() {
    assertThat(Typed.in(folder, "check", "--fail-on", "never").code()).isZero();
    assertThat(Typed.in(folder, "check", "--fail-on", "error").code()).isEqualTo(1);
    Typed wrong = Typed.in(folder, "check", "--fail-on", "fatal");
    assertThat(wrong.code()).isEqualTo(2);
    assertThat(wrong.err())
        .contains("'fatal' is none of: error, warning, information, hint, never");
  }

  @Test
  void whatCouldNotBeJudgedIsNotClean() throws IOException {
    write("part.channels.yaml", Boards.INCOMPLETE);
    Typed typed = Typed.in(folder, "check", "part.channels.yaml");
    assertThat(typed.code()).isZero();
    assertThat(typed.out())
        .contains("not-computed")
        .contains("/converters/adc/hold-capacitor")
        .contains("1 channel not fully judged");
    assertThat(Typed.in(folder, "check", "part.channels.yaml", "--fail-on-unjudged").code())
        .isEqualTo(1);
  }

  @Test
  void readsTheStandardInput() {
    Typed typed =
        Typed.in(
            folder, Boards.HASTY, Map.of(), false, "check", "-", "--stdin-name=mast.channels.yaml");
    assertThat(typed.code()).isEqualTo(1);
    assertThat(typed.out()).startsWith("mast.channels.yaml:");
  }

  @Test
  void whatCannotBeReadIsToldAndTheOthersAreChecked() {
    Typed typed =
        Typed.in(folder, "check", "boards/clean.channels.yaml", "boards/gone.channels.yaml");
    assertThat(typed.code()).isEqualTo(2);
    assertThat(typed.err())
        .isEqualTo("settlewell: boards/gone.channels.yaml: there is no such file\n");
    assertThat(typed.out()).contains("in 1 sheet; 1 file not read");
  }

  @Test
  void aFolderWithoutSheetsIsAnErrorAndNotClean() throws IOException {
    Files.createDirectories(folder.resolve("empty"));
    Typed typed = Typed.in(folder, "check", "empty");
    assertThat(typed.code()).isEqualTo(2);
    assertThat(typed.err()).contains("no channel sheet (NAME.channels.yaml) in empty");
  }

  @Test
  void coloursOnlyWhereAPersonReads() {
    String[] words = {"check", "boards"};
    assertThat(Typed.in(folder, words).out()).doesNotContain(ESCAPE);
    assertThat(coloured(true, Map.of())).contains(ESCAPE);
    assertThat(coloured(true, Map.of("NO_COLOR", "1"))).doesNotContain(ESCAPE);
    assertThat(coloured(false, Map.of("FORCE_COLOR", "1"))).contains(ESCAPE);
    assertThat(coloured(true, Map.of("FORCE_COLOR", "1", "NO_COLOR", "1"))).doesNotContain(ESCAPE);
    String without = coloured(true, Map.of()).replaceAll("\u001b\\[[0-9;]*m", "");
    assertThat(without).isEqualTo(Typed.in(folder, words).out());
  }

  private String coloured(boolean terminal, Map<String, String> environment) {
    return Typed.in(folder, "", environment, terminal, "check", "boards").out();
  }

  @Test
  void aTerminalIsNeverObeyed() throws IOException {
    write("evil.channels.yaml", Boards.CLEAN.replace("±0.2 V", "\"\u009b31m\u202e±x\""));
    String out = Typed.in(folder, "check", "evil.channels.yaml").out();
    assertThat(out).contains("evil.channels.yaml:").doesNotContain("\u009b", "\u202e");
    assertThat(Typed.in(folder, "check", "\u001b[2J").err()).doesNotContain("\u001b");
  }

  /** U+1F321 is one character, two units of UTF-16 and two columns of a terminal. */
  @Test
  void columnsCountCharacters() throws IOException {
    write(
        "wide.channels.yaml",
        Boards.HASTY.replace("mast: {", "mast: {about: \uD83C\uDF21, ").replace("10 Hz", "10 Ohm"));
    assertThat(Typed.in(folder, "check", "wide.channels.yaml").out())
        .contains("wide.channels.yaml:18:45 error wrong-unit\n")
        .contains(
            "    mast: {about: \uD83C\uDF21, converter: adc, rate: 10 Ohm, order: [heater]}\n"
                + " ".repeat(47)
                + "^^^\n");
  }

  @Test
  void aCharacterIsNeverCutInTwo() throws IOException {
    write("odd.channels.yaml", Boards.HASTY.replace("2 cycles", "\"\uD83C\uDF21 2\""));
    assertThat(Typed.in(folder, "check", "odd.channels.yaml").out()).doesNotContain("\uFFFD");
  }

  @Test
  void acceptedFindingsAreShownOnDemand() throws IOException {
    write(
        "accepted.channels.yaml",
        Boards.HASTY
            + "    accept:\n"
            + "      - {finding: acquisition-too-short, because: a trial board}\n");
    Typed quiet = Typed.in(folder, "check", "accepted.channels.yaml");
    assertThat(quiet.code()).isZero();
    assertThat(quiet.out()).isEqualTo("no findings in 1 sheet; 1 accepted\n");
    assertThat(Typed.in(folder, "check", "--accepted", "accepted.channels.yaml").out())
        .contains("accepted acquisition-too-short")
        .contains("accepted: a trial board");
  }

  @Test
  void aReaderThatHasSeenEnoughIsNoErrorButAFullDiskIs() {
    assertThat(intoAStreamThatFailsWith("Broken pipe")).isZero();
    assertThat(intoAStreamThatFailsWith("No space left on device")).isEqualTo(2);
  }

  private int intoAStreamThatFailsWith(String reason) {
    OutputStream out =
        new OutputStream() {
          @Override
          public void write(int b) throws IOException {
            throw new IOException(reason);
          }
        };
    return Typed.run(
        folder,
        "",
        out,
        new ByteArrayOutputStream(),
        Map.of(),
        false,
        "check",
        "boards/clean.channels.yaml");
  }

  @Test
  void remediesAreThoseThatHelp() {
    Typed typed = Typed.in(folder, "check", "--remedies", "boards/hasty.channels.yaml");
    assertThat(typed.out()).contains("\n  mend: Acquire for ");
  }
}
