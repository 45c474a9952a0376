package dev.settlewell.vocabulary;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import dev.settlewell.unit.Dimension;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Turns the JSON Schema with its {@code x-} words into a {@link Vocabulary}. The schema is part of
 * the program, so a fault in it is a fault of the program and throws.
 */
final class SchemaReader {
  private static final String RESOURCE = "/dev/settlewell/schema/channels.schema.json";
  private static final String MEASURED = "measured";
  private static final String MEASURED_PER_SECOND = "measured-per-second";

  private final JsonObject root;

  SchemaReader() {
    try (InputStream in = SchemaReader.class.getResourceAsStream(RESOURCE)) {
      if (in == null) {
        throw new IllegalStateException("the schema is missing: " + RESOURCE);
      }
      root =
          JsonParser.parseReader(new InputStreamReader(in, StandardCharsets.UTF_8))
              .getAsJsonObject();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  Vocabulary read() {
    Map<String, Kind> kinds = new LinkedHashMap<>();
    addKind(kinds, root);
    for (JsonElement definition : root.getAsJsonObject("$defs").asMap().values()) {
      addKind(kinds, definition.getAsJsonObject());
    }
    return new Vocabulary(kinds);
  }

  private void addKind(Map<String, Kind> kinds, JsonObject json) {
    // A definition with x-form describes a key that several kinds share, not a kind.
    if (!json.has("x-kind") || json.has("x-form")) {
      return;
    }
    Map<String, Key> keys = new LinkedHashMap<>();
    json.getAsJsonObject("properties")
        .asMap()
        .forEach((name, key) -> keys.put(name, key(name, key.getAsJsonObject())));
    Kind kind =
        new Kind(
            text(json, "x-kind").orElseThrow(),
            keys,
            text(json, "x-short"),
            texts(json, "x-columns"),
            !isFalse(json, "x-computed"),
            text(json, "description").orElse(""),
            texts(json, "examples"));
    kinds.put(kind.name(), kind);
  }

  private Key key(String name, JsonObject stated) {
    JsonObject json = resolved(stated);
    Shape shape = Shape.of(text(json, "x-form").orElseThrow(() -> noForm(name)));
    return new Key(
        name,
        shape,
        takes(json),
        json.has("x-words") ? texts(json, "x-words") : texts(json, "enum"),
        texts(json, "x-refers-to").stream()
            .filter(word -> !word.equals("figure"))
            .map(word -> NameKind.valueOf(word.toUpperCase(Locale.ROOT)))
            .findFirst(),
        text(json, "x-kind"),
        texts(json, "x-kinds"),
        item(name, shape, json),
        text(json, "x-names").map(word -> Key.MapNames.valueOf(word.toUpperCase(Locale.ROOT))),
        texts(json, "x-entries"),
        text(json, "x-part-of"),
        text(json, "x-errors-from"),
        isTrue(json, "x-required"),
        !isFalse(json, "x-computed"),
        text(json, "x-default"),
        texts(json, "x-units"),
        text(json, "description").orElse(""),
        texts(json, "examples"));
  }

  private Optional<Key> item(String name, Shape shape, JsonObject json) {
    return switch (shape) {
      case LIST -> Optional.of(key(name, json.getAsJsonObject("items")));
      case MAP -> Optional.of(key(name, json.getAsJsonObject("additionalProperties")));
      default -> Optional.empty();
    };
  }

  private static Key.Takes takes(JsonObject json) {
    List<Dimension> dimensions = new ArrayList<>();
    Key.Measured measured = Key.Measured.NO;
    for (String word : texts(json, "x-dimension")) {
      switch (word) {
        case MEASURED -> measured = Key.Measured.YES;
        case MEASURED_PER_SECOND -> measured = Key.Measured.PER_SECOND;
        default ->
            dimensions.add(Dimension.valueOf(word.toUpperCase(Locale.ROOT).replace('-', '_')));
      }
    }
    return new Key.Takes(
        dimensions,
        measured,
        isTrue(json, "x-positive"),
        number(json, "x-at-least").or(() -> number(json, "minimum")),
        number(json, "x-at-most").or(() -> number(json, "maximum")),
        isTrue(json, "x-difference"),
        isTrue(json, "x-shunt-sized"),
        isTrue(json, "x-increasing"),
        isTrue(json, "x-not-empty"),
        number(json, "x-size").map(Double::intValue));
  }

  /** The key with what its {@code $ref} says; its own words win. */
  private JsonObject resolved(JsonObject json) {
    Optional<String> reference = text(json, "$ref");
    if (reference.isEmpty()) {
      return json;
    }
    JsonObject merged = new JsonObject();
    JsonObject target = resolved(at(reference.get()));
    boolean sharedKey = target.has("x-form");
    for (Map.Entry<String, JsonElement> entry : target.entrySet()) {
      // Of a kind or a form that a key points at, the documentation is not the key's.
      if (sharedKey) {
        merged.add(entry.getKey(), entry.getValue());
      }
    }
    json.entrySet().forEach(entry -> merged.add(entry.getKey(), entry.getValue()));
    return merged;
  }

  private JsonObject at(String reference) {
    JsonObject here = root;
    for (String step : reference.substring("#/".length()).split("/")) {
      here = here.getAsJsonObject(step);
      if (here == null) {
        throw new IllegalStateException("the schema has nothing at " + reference);
      }
    }
    return here;
  }

  private static IllegalStateException noForm(String name) {
    return new IllegalStateException("the schema gives no x-form for the key " + name);
  }

  private static Optional<String> text(JsonObject json, String name) {
    return json.has(name) ? Optional.of(json.get(name).getAsString()) : Optional.empty();
  }

  private static Optional<Double> number(JsonObject json, String name) {
    return json.has(name) ? Optional.of(json.get(name).getAsDouble()) : Optional.empty();
  }

  /** The strings and numbers of an array; truth values are there for YAML 1.1 readers only. */
  private static List<String> texts(JsonObject json, String name) {
    List<String> texts = new ArrayList<>();
    JsonArray array = json.has(name) ? json.getAsJsonArray(name) : new JsonArray();
    for (JsonElement element : array) {
      if (!element.getAsJsonPrimitive().isBoolean()) {
        texts.add(element.getAsString());
      }
    }
    return texts;
  }

  private static boolean isTrue(JsonObject json, String name) {
    return json.has(name) && json.get(name).getAsBoolean();
  }

  private static boolean isFalse(JsonObject json, String name) {
    return json.has(name) && !json.get(name).getAsBoolean();
  }
}
