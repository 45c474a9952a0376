package dev.settlewell.vocabulary;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class VocabularyTest {
  private final Vocabulary vocabulary = Vocabulary.load();

  @Test
  void every_kind_that_a_key_names_is_there() {
    for (Kind kind : vocabulary.kinds().values()) {
      for (Key key : kind.keys().values()) {
        key.kind().ifPresent(name -> assertThat(vocabulary.find(name)).as(name).isPresent());
        key.kinds().forEach(name -> assertThat(vocabulary.find(name)).as(name).isPresent());
        key.item()
            .flatMap(Key::kind)
            .ifPresent(name -> assertThat(vocabulary.find(name)).as(name).isPresent());
      }
      kind.shortKey().ifPresent(name -> assertThat(kind.keys()).containsKey(name));
      kind.columns().forEach(name -> assertThat(kind.keys()).containsKey(name));
    }
  }

  /** The format's habit: lower-case words joined by hyphens. */
  @Test
  void keys_and_kinds_are_words_joined_by_hyphens() {
    for (Kind kind : vocabulary.kinds().values()) {
      assertThat(kind.name()).matches("[a-z][a-z0-9]*(-[a-z0-9]+)*");
      assertThat(kind.keys().keySet()).allMatch(key -> key.matches("[a-z][a-z0-9]*(-[a-z0-9]+)*"));
    }
  }

  @Test
  void a_quantity_says_its_dimension() {
    for (Kind kind : vocabulary.kinds().values()) {
      for (Key key : kind.keys().values()) {
        boolean carriesUnit = key.shape().ordinal() <= Shape.OUTPUT_RANGE.ordinal();
        boolean says =
            !key.takes().dimensions().isEmpty() || key.takes().measured() != Key.Measured.NO;
        if (carriesUnit && key.partOf().isEmpty() && !kind.name().equals(Vocabulary.LONG_FORM)) {
          assertThat(says).as(kind.name() + "." + key.name()).isTrue();
        }
      }
    }
  }

  /** Distances by hand; the last two pairs are the usual textbook examples of edit distance. */
  @ParameterizedTest
  @CsvSource({"supply,suply,1", "gain,gian,1", "a,a,0", "ab,'',2", "kitten,sitting,3", "ca,abc,3"})
  void counts_insertions_deletions_replacements_and_swaps(String a, String b, int distance) {
    assertThat(Nearest.distance(a, b)).isEqualTo(distance);
    assertThat(Nearest.distance(b, a)).isEqualTo(distance);
  }

  @Test
  void the_nearest_is_near() {
    List<String> known = List.of("supply", "reference", "bits");
    assertThat(Nearest.of("Supply", known)).contains("supply");
    assertThat(Nearest.of("refrence", known)).contains("reference");
    assertThat(Nearest.of("x", known)).isEmpty();
    assertThat(Nearest.of("bandwidth", known)).isEmpty();
  }
}
