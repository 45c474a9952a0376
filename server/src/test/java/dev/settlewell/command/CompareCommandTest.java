package dev.settlewell.command;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CompareCommandTest {
  @TempDir private Path folder;

  @BeforeEach
  void write() throws IOException {
    write("old/mast.channels.yaml", Boards.CLEAN);
    write("old/same.channels.yaml", Boards.CLEAN);
    write("old/gone.channels.yaml", Boards.CLEAN);
    write("new/mast.channels.yaml", "# moved by a comment\n" + Boards.HASTY);
    write("new/same.channels.yaml", "# moved by a comment\n" + Boards.CLEAN);
    write("new/added.channels.yaml", Boards.CLEAN);
  }

  private void write(String name, String text) throws IOException {
    Path file = folder.resolve(name);
    Files.createDirectories(file.getParent());
    Files.writeString(file, text);
  }

  @Test
  void tellsNewFindingsAndChangedFigures() {
    Typed typed = Typed.in(folder, "compare", "old", "new");
    assertThat(typed.code()).isEqualTo(1);
    assertThat(typed.out())
        .contains("new finding: error acquisition-too-short (new/mast.channels.yaml:28:18)\n")
        .contains("  acquisition-cycles             96 cycles -> 2 cycles\n")
        .doesNotContain("  lsb ")
        .contains("gone.channels.yaml\nthis sheet is gone\n")
        .contains("added.channels.yaml\nthis sheet is new\n")
        .endsWith("3 sheets changed, 1 not\n");
  }

  @Test
  void whatIsMendedIsNoReasonToFail() {
    Typed typed = Typed.in(folder, "compare", "new/mast.channels.yaml", "old/mast.channels.yaml");
    assertThat(typed.code()).isZero();
    assertThat(typed.out()).contains("no longer found: error acquisition-too-short");
  }

  @Test
  void aSheetIsEqualToItself() {
    Typed typed = Typed.in(folder, "compare", "old", "old");
    assertThat(typed).isEqualTo(new Typed(0, "no figure and no finding changed\n", ""));
  }

  @Test
  void writesMarkdownForAReview() {
    Typed typed = Typed.in(folder, "compare", "--format=markdown", "old", "new");
    assertThat(typed.out())
        .contains("### `mast.channels.yaml`\n\n- new finding: error `")
        .contains("**channel heater, scan mast**\n\n- `acquisition`: 12.0 µs → 250 ns\n");
  }

  @Test
  void comparesLikeWithLike() {
    Typed typed = Typed.in(folder, "compare", "old", "new/mast.channels.yaml");
    assertThat(typed.code()).isEqualTo(2);
    assertThat(typed.err()).isEqualTo("settlewell: compare two sheets, or two folders\n");
  }
}
