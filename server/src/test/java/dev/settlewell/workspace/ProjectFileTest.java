package dev.settlewell.workspace;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ProjectFileTest {
  private static ProjectFile read(String text) {
    return ProjectFile.read(SourceText.of(Workspace.PROJECT_FILE, text));
  }

  @Test
  void saysFewThings() {
    ProjectFile file = read("documentation: https://docs.example/findings\nfail-on: error\n");
    assertThat(file.documentation()).contains("https://docs.example/findings");
    assertThat(file.failOn()).contains("error");
    assertThat(file.problems()).isEmpty();
    assertThat(read("")).isEqualTo(ProjectFile.NONE);
  }

  @Test
  void aMistakeCostsItselfOnly() {
    ProjectFile file = read("fail-on: errors\nfail_on: error\ndocumentation: https://a.example\n");
    assertThat(file.documentation()).contains("https://a.example");
    assertThat(file.failOn()).isEmpty();
    assertThat(file.problems())
        .extracting(Problem::kind)
        .containsExactly(Problem.Kind.WRONG_KIND, Problem.Kind.UNKNOWN_KEY);
  }

  @Test
  void theNearestOneCountsAndNoneBeyondTheRepository(@TempDir Path folder) throws IOException {
    Path inner = Files.createDirectories(folder.resolve("outer/repository/boards"));
    Files.writeString(folder.resolve("outer/.settlewell.yaml"), "fail-on: never\n");
    DiskReader reader = new DiskReader(inner);
    assertThat(ProjectFile.above("", reader).failOn()).contains("never");
    Files.createDirectory(folder.resolve("outer/repository/.git"));
    assertThat(ProjectFile.above("", reader)).isEqualTo(ProjectFile.NONE);
    Files.writeString(folder.resolve("outer/repository/.settlewell.yaml"), "fail-on: hint\n");
    assertThat(ProjectFile.above("", reader).failOn()).contains("hint");
  }
}
