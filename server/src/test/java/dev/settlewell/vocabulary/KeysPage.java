package dev.settlewell.vocabulary;

import java.util.List;
import java.util.stream.Collectors;

/** Writes {@code schema/keys.md}, the list of every key, from the schema. */
final class KeysPage {
  private final Vocabulary vocabulary;
  private final StringBuilder page = new StringBuilder();

  private KeysPage(Vocabulary vocabulary) {
    this.vocabulary = vocabulary;
  }

  static String of(Vocabulary vocabulary) {
    return new KeysPage(vocabulary).write();
  }

  private String write() {
    page.append("# Every key of a channel sheet\n\n");
    page.append("Made from `channels.schema.json`; a test fails when this page is stale.\n");
    page.append("The forms of values are explained in [README.md](README.md).\n");
    for (Kind kind : vocabulary.kinds().values()) {
      kind(kind);
    }
    return page.toString();
  }

  private void kind(Kind kind) {
    page.append("\n## ").append(title(kind)).append("\n\n").append(kind.doc()).append('\n');
    if (!kind.computed()) {
      page.append("\nRead, not computed with yet.\n");
    }
    if (!kind.examples().isEmpty()) {
      page.append("\n```yaml\n").append(String.join("\n", kind.examples())).append("\n```\n");
    }
    page.append('\n');
    for (Key key : kind.keys().values()) {
      if (key.partOf().isEmpty() || kind.name().equals(Vocabulary.LONG_FORM)) {
        key(key);
      }
    }
  }

  private static String title(Kind kind) {
    return kind.name().equals(Vocabulary.SHEET) ? "The sheet" : "`" + kind.name() + "`";
  }

  private void key(Key key) {
    page.append("- `").append(key.name()).append("` (").append(form(key)).append("): ");
    page.append(key.doc());
    key.standard().ifPresent(text -> page.append(" Unless given: `").append(text).append("`."));
    if (!key.computed()) {
      page.append(" Read, not computed with yet.");
    }
    page.append("  \n  ");
    page.append(
        key.examples().stream()
            .map(example -> "`" + key.name() + ": " + example + "`")
            .collect(Collectors.joining("  \n  ")));
    page.append('\n');
  }

  private String form(Key key) {
    StringBuilder form = new StringBuilder();
    if (key.required()) {
      form.append("required, ");
    }
    form.append(
        switch (key.shape()) {
          case QUANTITY, COMPONENT -> "a quantity" + units(key);
          case DEVIATION -> "errors" + units(key);
          case NEED -> "a need" + units(key);
          case RANGE, OUTPUT_RANGE -> "a range" + units(key);
          case COUNT -> key.words().isEmpty() ? "a whole number" : words(key.words());
          case PLAIN -> "a number";
          case FRACTION -> "a fraction";
          case RATIO -> "a ratio";
          case TEXT -> "text";
          case NAME -> key.refersTo().map(k -> "the name of " + k.withArticle()).orElse("a name");
          case CHOICE -> words(key.words());
          case FLAG -> "`true` or `false`";
          case DATE -> "a date";
          case PART -> link(key.kind().orElseThrow());
          case ONE_KIND -> "one of " + kinds(key.kinds());
          case LIST -> "a list, each " + form(key.item().orElseThrow());
          case MAP -> mapped(key);
        });
    if (key.takesWordOrQuantity()) {
      key.refersTo().ifPresent(kind -> form.append(", or the name of ").append(kind.withArticle()));
      if (!key.words().isEmpty()) {
        form.append(", or ").append(words(key.words()));
      }
    }
    return form.toString();
  }

  private String mapped(Key key) {
    Key.MapNames names = key.names().orElseThrow();
    String by =
        switch (names) {
          case NUMBER -> "by number";
          case FINDING -> "by the name of a finding";
          default -> "by name";
        };
    return by + ", each " + form(key.item().orElseThrow());
  }

  private static String units(Key key) {
    String measured =
        switch (key.takes().measured()) {
          case NO -> "";
          case YES -> " in the measured unit";
          case PER_SECOND -> " in the measured unit per second";
        };
    if (key.units().isEmpty()) {
      return measured;
    }
    String units = String.join(", ", key.units());
    return measured.isEmpty() ? " in " + units : measured + " or " + units;
  }

  private static String words(List<String> words) {
    return words.stream().map(word -> "`" + word + "`").collect(Collectors.joining(", "));
  }

  private static String kinds(List<String> kinds) {
    return kinds.stream().map(KeysPage::link).collect(Collectors.joining(", "));
  }

  private static String link(String kind) {
    return "[`" + kind + "`](#" + kind + ")";
  }
}
