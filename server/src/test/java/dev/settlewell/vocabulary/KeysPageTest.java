package dev.settlewell.vocabulary;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

class KeysPageTest {
  private static final Path PAGE = Path.of("../schema/keys.md");

  /** {@code mvn -pl server test -Dtest=KeysPageTest -Dpages=write} writes it anew. */
  @Test
  void the_page_of_keys_says_what_the_schema_says() throws IOException {
    String page = KeysPage.of(Vocabulary.load());
    if ("write".equals(System.getProperty("pages"))) {
      Files.writeString(PAGE, page);
    }
    assertThat(Files.readString(PAGE)).isEqualTo(page);
  }
}
