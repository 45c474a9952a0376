package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Forms of file URIs: RFC 8089, section 2 and appendix E.2; percent-encoding: RFC 3986, 2.1. */
class UrisTest {

  @ParameterizedTest
  @CsvSource({
    "file:///home/a/b.channels.yaml, /home/a/b.channels.yaml",
    "file:///home/my%20board/b%25.channels.yaml, /home/my board/b%.channels.yaml",
    "file:///home/M%C3%BCller/b.yaml, /home/Müller/b.yaml",
    "file:///home/Müller/b.yaml, /home/Müller/b.yaml",
    "file:///c%3A/work/b.yaml, C:/work/b.yaml",
    "file:///C:/work/b.yaml, C:/work/b.yaml",
    "FILE:///c:/work/b.yaml, C:/work/b.yaml",
    "file://localhost/home/b.yaml, /home/b.yaml",
    "file://server/share/b.yaml, //server/share/b.yaml",
    "file:///home/100%/b.yaml, /home/100%/b.yaml",
    "file:///home/%zz.yaml, /home/%zz.yaml",
    "untitled:Untitled-1, untitled:Untitled-1",
  })
  void oneNameForEverySpelling(String uri, String name) {
    assertThat(Uris.name(uri)).isEqualTo(name);
  }

  @ParameterizedTest
  @CsvSource({
    "/home/my board/b%.yaml, file:///home/my%20board/b%25.yaml",
    "/home/Müller/b.yaml, file:///home/M%C3%BCller/b.yaml",
    "C:/work/b.yaml, file:///C%3A/work/b.yaml",
    "//server/share/b.yaml, file://server/share/b.yaml",
    "untitled:Untitled-1, untitled:Untitled-1",
  })
  void namesBecomeUris(String name, String uri) {
    assertThat(Uris.uri(name)).isEqualTo(uri);
  }

  @Test
  void nameOfUriOfNameIsTheName() {
    String odd = "/a b/#1?/[x]/ü%20/😀/c:d/e.channels.yaml";
    assertThat(Uris.name(Uris.uri(odd))).isEqualTo(odd);
    assertThat(java.net.URI.create(Uris.uri(odd)).getPath()).isEqualTo(odd);
  }
}
