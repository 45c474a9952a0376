package dev.settlewell.review;

import com.google.gson.JsonObject;
import dev.settlewell.finding.Acceptance;
import dev.settlewell.finding.Fact;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Related;
import java.util.List;

/** Findings as {@code schema/findings.schema.json} describes them. */
public final class FindingsJson {
  private final Locations locations;
  private final Envelope envelope;

  private FindingsJson(Review review) {
    this.locations = review.locations();
    this.envelope = new Envelope(locations);
  }

  public static String render(Review review) {
    FindingsJson json = new FindingsJson(review);
    JsonObject root = Envelope.head(review);
    root.add("sheets", Json.array(review.sheets(), json::sheet));
    Json.arrayIfAny(root, "failures", review.failures(), Envelope::failure);
    root.add("summary", summary(Summary.of(review)));
    return Json.write(root);
  }

  private JsonObject sheet(Reviewed sheet) {
    JsonObject object = Envelope.sheet(sheet);
    object.add("findings", Json.array(sheet.findings(), finding -> finding(sheet, finding)));
    return object;
  }

  private JsonObject finding(Reviewed sheet, Finding finding) {
    String home = sheet.path();
    JsonObject object = new JsonObject();
    object.addProperty("name", finding.name());
    object.addProperty("severity", finding.severity().label());
    object.add("place", envelope.place(finding.place(), home));
    object.addProperty("written", locations.written(finding.place()));
    if (!finding.subject().isEmpty()) {
      object.addProperty("subject", finding.subject());
    }
    if (!finding.about().isEmpty()) {
      object.addProperty("about", finding.about());
    }
    object.addProperty("message", finding.message());
    Json.arrayIfAny(object, "facts", finding.facts(), FindingsJson::fact);
    Json.arrayIfAny(object, "related", finding.related(), related -> related(related, home));
    List<Fix> remedies = sheet.remedies().getOrDefault(finding, List.of());
    Json.arrayIfAny(object, "remedies", remedies, fix -> remedy(fix, home));
    finding.acceptance().ifPresent(a -> object.add("accepted", acceptance(a, home)));
    return object;
  }

  private static JsonObject fact(Fact fact) {
    JsonObject object = new JsonObject();
    object.addProperty("label", fact.label());
    object.addProperty("text", fact.text());
    return object;
  }

  private JsonObject related(Related related, String home) {
    JsonObject object = new JsonObject();
    object.add("place", envelope.place(related.place(), home));
    object.addProperty("message", related.message());
    return object;
  }

  private JsonObject remedy(Fix fix, String home) {
    JsonObject object = new JsonObject();
    object.addProperty("title", fix.title());
    object.addProperty("safe", fix.safe());
    object.add("edits", Json.array(fix.edits(), edit -> edit(edit, home)));
    return object;
  }

  private JsonObject edit(Edit edit, String home) {
    JsonObject object = new JsonObject();
    object.add("place", envelope.place(edit.place(), home));
    object.addProperty("replacement", edit.replacement());
    return object;
  }

  private JsonObject acceptance(Acceptance acceptance, String home) {
    JsonObject object = new JsonObject();
    object.addProperty("because", acceptance.because());
    object.add("place", envelope.place(acceptance.place(), home));
    return object;
  }

  private static JsonObject summary(Summary summary) {
    JsonObject object = new JsonObject();
    object.addProperty("sheets", summary.sheets());
    object.addProperty("errors", summary.count(Severity.ERROR));
    object.addProperty("warnings", summary.count(Severity.WARNING));
    object.addProperty("information", summary.count(Severity.INFORMATION));
    object.addProperty("hints", summary.count(Severity.HINT));
    object.addProperty("accepted", summary.accepted());
    object.addProperty("not-fully-judged", summary.unjudged());
    return object;
  }
}
