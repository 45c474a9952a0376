package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.text.SourceText;
import java.util.Map;
import java.util.Optional;

/** What the server asks of everything below it. The answer depends on the texts alone. */
interface Desk {

  /**
   * @param open what editors hold, by name; it stands for the files of these names
   * @return empty where no such sheet is open or on disk
   */
  Optional<Checked> check(String name, Map<String, SourceText> open);
}
