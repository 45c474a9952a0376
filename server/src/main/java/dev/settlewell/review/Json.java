package dev.settlewell.review;

import com.google.gson.Gson;
import com.google.gson.GsonBuilder;
import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * How all JSON of ours is written: two blanks, ten significant digits, nothing of the machine's.
 */
final class Json {
  /** The last bits of a figure differ between versions of Java; these digits do not. */
  private static final MathContext DIGITS = new MathContext(10, RoundingMode.HALF_EVEN);

  private static final Gson GSON =
      new GsonBuilder().setPrettyPrinting().disableHtmlEscaping().serializeNulls().create();

  private Json() {}

  static String write(JsonObject object) {
    return GSON.toJson(object) + "\n";
  }

  /**
   * @throws IllegalArgumentException for values that JSON has no number for
   */
  static JsonElement number(double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException("JSON has no number for " + value);
    }
    BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
    boolean whole = rounded.scale() < 0 && rounded.scale() > -15;
    return new JsonPrimitive(whole ? rounded.setScale(0) : rounded);
  }

  static void number(JsonObject object, String key, double value) {
    if (Double.isFinite(value)) {
      object.add(key, number(value));
    }
  }

  static void number(JsonObject object, String key, OptionalDouble value) {
    value.ifPresent(known -> number(object, key, known));
  }

  static <T> JsonArray array(List<T> items, Function<? super T, ? extends JsonElement> item) {
    JsonArray array = new JsonArray();
    items.forEach(each -> array.add(item.apply(each)));
    return array;
  }

  static JsonArray strings(List<String> items) {
    return array(items, JsonPrimitive::new);
  }

  static <T> void arrayIfAny(
      JsonObject object,
      String key,
      List<T> items,
      Function<? super T, ? extends JsonElement> item) {
    if (!items.isEmpty()) {
      object.add(key, array(items, item));
    }
  }

  static JsonObject quantity(double value, String unit) {
    JsonObject object = new JsonObject();
    number(object, "value", value);
    object.addProperty("unit", unit);
    return object;
  }
}
