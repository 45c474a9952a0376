package dev.settlewell.command;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class MendCommandTest {
  @TempDir private Path folder;

  private Path write(String text) throws IOException {
    return Files.writeString(folder.resolve("mast.channels.yaml"), text);
  }

  @Test
  void mendsASpellingAndLeavesTheRest() throws IOException {
    Path sheet = write(Boards.MISSPELT);
    Typed typed = Typed.in(folder, "mend", "mast.channels.yaml");
    assertThat(typed.code()).isZero();
    assertThat(typed.out())
        .contains("mast.channels.yaml:26:29 wrong-unit: ")
        .contains("  -       - divider: {upper: 47 KΩ")
        .contains("  +       - divider: {upper: 47 kΩ")
        .endsWith("1 change in 1 sheet\n");
    assertThat(Files.readString(sheet)).isEqualTo(Boards.CLEAN);
    assertThat(Typed.in(folder, "mend", "mast.channels.yaml").out()).isEqualTo("nothing to mend\n");
  }

  @Test
  void keepsLineEndsAndTheByteOrderMark() throws IOException {
    Path sheet = write("\uFEFF" + Boards.MISSPELT.replace("\n", "\r\n"));
    assertThat(Typed.in(folder, "mend", ".").code()).isZero();
    assertThat(Files.readString(sheet)).isEqualTo("\uFEFF" + Boards.CLEAN.replace("\n", "\r\n"));
  }

  @Test
  void writesNothingWhenItOnlyTries() throws IOException {
    Path sheet = write(Boards.MISSPELT);
    assertThat(Typed.in(folder, "mend", "--dry-run", ".").out())
        .endsWith("1 change in 1 sheet; nothing was written\n");
    assertThat(Files.readString(sheet)).isEqualTo(Boards.MISSPELT);
  }

  @Test
  void guessesNoValue() throws IOException {
    String text = Boards.CLEAN.replace("rate: 10 Hz", "rate: 10");
    Path sheet = write(text);
    assertThat(Typed.in(folder, "mend", ".").out()).isEqualTo("nothing to mend\n");
    assertThat(Files.readString(sheet)).isEqualTo(text);
  }

  @Test
  void appliesAComputedValueOnlyWhenItsFindingIsNamed() throws IOException {
    write(Boards.HASTY);
    assertThat(Typed.in(folder, "mend", ".").out()).isEqualTo("nothing to mend\n");
    assertThat(Typed.in(folder, "mend", "--finding=acquisition-too-short", ".").code()).isZero();
    assertThat(Typed.in(folder, "check", ".").out()).doesNotContain("acquisition-too-short");
    Typed typo = Typed.in(folder, "mend", "--finding=acquisition-to-short", ".");
    assertThat(typo.code()).isEqualTo(2);
    assertThat(typo.err()).contains("did you mean acquisition-too-short?");
  }

  @Test
  void keepsRightsAndLinksAndLeavesNoFileBehind() throws IOException {
    Path sheet = write(Boards.MISSPELT);
    Files.setPosixFilePermissions(sheet, PosixFilePermissions.fromString("rw-r-----"));
    Path link = folder.resolve("linked.channels.yaml");
    Files.createSymbolicLink(link, sheet.getFileName());
    assertThat(Typed.in(folder, "mend", "linked.channels.yaml").code()).isZero();
    assertThat(Files.isSymbolicLink(link)).isTrue();
    assertThat(Files.readString(sheet)).isEqualTo(Boards.CLEAN);
    assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(sheet)))
        .isEqualTo("rw-r-----");
    try (Stream<Path> files = Files.list(folder)) {
      assertThat(files).containsExactlyInAnyOrder(sheet, link);
    }
  }

  @Test
  void doesNotOverwriteWhatSomebodyElseWroteMeanwhile() throws IOException {
    Path sheet = write("somebody else's");
    assertThrows(
        InputException.class, () -> AtomicWriter.replace(sheet, Boards.MISSPELT, Boards.CLEAN));
    assertThat(Files.readString(sheet)).isEqualTo("somebody else's");
  }
}
