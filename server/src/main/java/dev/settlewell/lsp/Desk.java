package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.ProjectFile;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What the server asks of everything below it. The answers depend on the texts alone. */
interface Desk {

  /**
   * @param open what editors hold, by name; it stands for the files of these names
   * @return empty where no such sheet is open or on disk
   */
  Optional<Checked> check(String name, Map<String, SourceText> open);

  /** The findings a sheet would have with another text. */
  List<Finding> trial(String name, String content, Map<String, SourceText> open);

  Vocabulary vocabulary();

  /** The sheets on disk below a folder that is marked as a workspace; none below any other. */
  List<String> sheetsBelow(String folder);

  /** The settings of the project that a folder belongs to. */
  ProjectFile project(String folder);
}
