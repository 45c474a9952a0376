package dev.settlewell.review;

import com.google.gson.JsonObject;
import dev.settlewell.text.Place;
import dev.settlewell.text.PositionEncoding;

/** What all JSON of ours has in common: the head, and how a place is written. */
final class Envelope {
  private static final int FORM = 1;

  private final Locations locations;

  Envelope(Locations locations) {
    this.locations = locations;
  }

  static JsonObject head(Review review) {
    JsonObject head = new JsonObject();
    head.addProperty("form", FORM);
    head.addProperty("tool", review.tool());
    head.addProperty("date", review.date().toString());
    return head;
  }

  static JsonObject sheet(Reviewed sheet) {
    JsonObject object = new JsonObject();
    object.addProperty("path", sheet.path());
    object.addProperty("digest", "sha256:" + Digest.of(sheet.text().content()));
    return object;
  }

  static JsonObject failure(Review.Failure failure) {
    JsonObject object = new JsonObject();
    object.addProperty("path", failure.path());
    object.addProperty("message", failure.message());
    return object;
  }

  /** The path only where it is another one than that of the sheet that is told of. */
  JsonObject place(Place place, String home) {
    JsonObject object = new JsonObject();
    String path = place.sheet();
    if (!path.equals(home)) {
      object.addProperty("path", path);
    }
    locations
        .of(place, PositionEncoding.UTF_32)
        .ifPresent(
            at -> {
              object.addProperty("line", at.line());
              object.addProperty("column", at.column());
              object.addProperty("end-line", at.endLine());
              object.addProperty("end-column", at.endColumn());
            });
    return object;
  }
}
