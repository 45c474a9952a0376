package dev.settlewell.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.GsonBuilder;
import com.google.gson.JsonPrimitive;
import com.google.gson.JsonSerializer;
import com.networknt.schema.Error;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaLocation;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Date;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.Yaml;
import org.yaml.snakeyaml.constructor.SafeConstructor;

/**
 * The schema by itself, as editors without the server use it, against a validator of its standard.
 */
class SchemaTest {
  private static final String SCHEMA =
      Bound.resource("/dev/settlewell/schema/channels.schema.json");
  private static final SchemaRegistry REGISTRY =
      SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12);

  @Test
  void is_valid_by_its_own_metaschema() {
    Schema meta =
        REGISTRY.getSchema(SchemaLocation.of(SpecificationVersion.DRAFT_2020_12.getDialectId()));
    assertThat(meta.validate(SCHEMA, InputFormat.JSON)).isEmpty();
  }

  @Test
  void takes_the_sheet_that_uses_every_key() {
    assertThat(faults(Bound.resource("press.channels.yaml"))).isEmpty();
  }

  /** What any editor should mark: shapes, keys, bare numbers where a unit belongs. */
  @ParameterizedTest
  @ValueSource(
      strings = {
        "{}",
        "channel-sheet: 2",
        "{channel-sheet: 1, suplies: {}}",
        "{channel-sheet: 1, supplies: {ref: 2.5}}",
        "{channel-sheet: 1, supplies: {Ref: 2.5 V}}",
        "{channel-sheet: 1, converters: {adc: {bits: 12}}}",
        "{channel-sheet: 1, converters: {adc: {bits: 33, reference: ref}}}",
        "{channel-sheet: 1, converters: {adc: {bits: 12, reference: ref, input: both}}}",
        "{channel-sheet: 1, channels: {c: {measures: 1 V, sensor: {voltage: {}}}}}",
        "{channel-sheet: 1, channels: {c: {measures: 0 V to 1 V, sensor: {voltage: {}, rtd: {}}}}}",
        "{channel-sheet: 1, channels: {c: {measures: 0 V to 1 V, sensor: {volt: {}}}}}",
        "{channel-sheet: 1, channels: {c: {measures: 0 V to 1 V, sensor: {voltage: {}},"
            + " path: {resistor: 1 kΩ}}}}",
        "{channel-sheet: 1, channels: {c: {measures: 0 V to 1 V, sensor: {voltage: {}},"
            + " path: [{resistor: 1}]}}}"
      })
  void refuses_what_any_editor_should_mark(String sheet) {
    assertThat(faults(sheet)).isNotEmpty();
  }

  private static List<Error> faults(String yaml) {
    Object loaded = new Yaml(new SafeConstructor(new LoaderOptions())).load(yaml);
    JsonSerializer<Date> day =
        (date, type, context) ->
            new JsonPrimitive(date.toInstant().atOffset(ZoneOffset.UTC).toLocalDate().toString());
    String json =
        new GsonBuilder()
            .serializeNulls()
            .registerTypeHierarchyAdapter(Date.class, day)
            .create()
            .toJson(loaded);
    Schema schema = REGISTRY.getSchema(SCHEMA, InputFormat.JSON);
    return schema.validate(json, InputFormat.JSON);
  }

  @Test
  void documents_every_key_with_an_example_that_binds() {
    List<String> wanting = new ArrayList<>();
    for (Kind kind : Bound.VOCABULARY.kinds().values()) {
      if (kind.doc().isBlank()) {
        wanting.add(kind.name());
      }
      for (Key key : kind.keys().values()) {
        if (key.doc().isBlank() || key.examples().isEmpty()) {
          wanting.add(kind.name() + "." + key.name() + " has no documentation or example");
        }
        if (!kind.name().equals("long-form")) {
          key.examples().forEach(example -> wanting.addAll(problems(kind, key, example)));
        }
      }
    }
    assertThat(wanting).isEmpty();
  }

  private static List<String> problems(Kind kind, Key key, String example) {
    SourceText text = SourceText.of("example", key.name() + ": " + example + "\n");
    SyntaxTree tree = Syntax.parse(text);
    Report report = new Report();
    new Binder(Bound.VOCABULARY, text, report)
        .mapping(kind, tree.root(), text.place(0, 0), "", Scope.EMPTY);
    List<Problem> problems = new ArrayList<>(tree.problems());
    problems.addAll(report.sorted());
    return problems.stream()
        .filter(problem -> problem.kind() != Problem.Kind.MISSING_KEY)
        .map(problem -> kind.name() + ": " + text.content().strip() + " " + problem.message())
        .toList();
  }

  @Test
  void examples_of_kinds_bind_as_they_stand() {
    for (Kind kind : Bound.VOCABULARY.kinds().values()) {
      for (String example : kind.examples()) {
        boolean stage =
            Bound.VOCABULARY
                .kind("channel")
                .keys()
                .get("path")
                .item()
                .orElseThrow()
                .kinds()
                .contains(kind.name());
        if (kind.name().equals("long-form")) {
          continue;
        }
        Key key = Bound.VOCABULARY.kind("channel").keys().get(stage ? "path" : "sensor");
        String value = stage ? "[{" + example + "}]" : "{" + example + "}";
        if (!kind.name().equals("beta")) {
          assertThat(problems(Bound.VOCABULARY.kind("channel"), key, value)).isEmpty();
        }
      }
    }
  }
}
