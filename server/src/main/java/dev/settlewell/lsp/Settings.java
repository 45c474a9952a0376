package dev.settlewell.lsp;

import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import java.util.Optional;

/**
 * What a user may choose in the editor. Few, and each has a default that suits most.
 *
 * @param documentation base URL of the pages of the findings; "" where there is none
 * @param unopenedSheets whether sheets of the workspace that nobody opened are checked too
 */
record Settings(
    String documentation,
    boolean unopenedSheets,
    boolean codeLens,
    boolean hintResolution,
    boolean hintAcquisition,
    boolean hintValues,
    boolean hintInterferers,
    boolean hintShares) {

  static final String SECTION = "settlewell";
  static final Settings DEFAULT = new Settings("", true, true, true, true, true, true, true);

  Settings withDocumentation(String url) {
    return new Settings(
        url,
        unopenedSheets,
        codeLens,
        hintResolution,
        hintAcquisition,
        hintValues,
        hintInterferers,
        hintShares);
  }

  /**
   * Reads what a client sends: the section itself or an object that holds it. Neovim sends an empty
   * array where nothing is set, others null or strings; whatever is not understood keeps its value.
   */
  Settings with(JsonElement json) {
    if (json == null || !json.isJsonObject()) {
      return this;
    }
    JsonObject given = json.getAsJsonObject();
    if (given.has(SECTION) && given.get(SECTION).isJsonObject()) {
      given = given.getAsJsonObject(SECTION);
    }
    JsonObject hints =
        given.has("inlayHints") && given.get("inlayHints").isJsonObject()
            ? given.getAsJsonObject("inlayHints")
            : new JsonObject();
    return new Settings(
        text(given, "documentation").orElse(documentation),
        flag(given, "unopenedSheets").orElse(unopenedSheets),
        flag(given, "codeLens").orElse(codeLens),
        flag(hints, "resolution").orElse(hintResolution),
        flag(hints, "acquisition").orElse(hintAcquisition),
        flag(hints, "values").orElse(hintValues),
        flag(hints, "interferers").orElse(hintInterferers),
        flag(hints, "shares").orElse(hintShares));
  }

  private static Optional<Boolean> flag(JsonObject object, String key) {
    JsonElement value = object.get(key);
    boolean is = value != null && value.isJsonPrimitive() && value.getAsJsonPrimitive().isBoolean();
    return is ? Optional.of(value.getAsBoolean()) : Optional.empty();
  }

  private static Optional<String> text(JsonObject object, String key) {
    JsonElement value = object.get(key);
    boolean is = value != null && value.isJsonPrimitive() && value.getAsJsonPrimitive().isString();
    return is ? Optional.of(value.getAsString()) : Optional.empty();
  }
}
