package dev.settlewell.review;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.finding.Pages;
import dev.settlewell.finding.Severity;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.Related;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Findings as SARIF 2.1.0 (OASIS, Static Analysis Results Interchange Format), for code hosts and
 * viewers. What could not be judged is a result of kind {@code open}; faults of this program and
 * files that could not be read are notifications of the invocation.
 */
public final class FindingsSarif {
  private static final String SCHEMA =
      "https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json";
  private static final String ROOT = "SRCROOT";
  private static final String FINGERPRINT = "settlewellFinding/v1";

  private final Review review;
  private final Locations locations;
  private final Map<String, Integer> ruleIndex = new HashMap<>();
  private final Map<String, Integer> seen = new HashMap<>();

  private FindingsSarif(Review review) {
    this.review = review;
    this.locations = review.locations();
    for (String name : Catalog.NAMES) {
      ruleIndex.put(name, ruleIndex.size());
    }
  }

  public static String render(Review review) {
    JsonObject root = new JsonObject();
    root.addProperty("$schema", SCHEMA);
    root.addProperty("version", "2.1.0");
    JsonArray runs = new JsonArray();
    runs.add(new FindingsSarif(review).run());
    root.add("runs", runs);
    return Json.write(root);
  }

  private JsonObject run() {
    JsonObject run = new JsonObject();
    run.add("tool", object("driver", driver()));
    run.addProperty("columnKind", "utf16CodeUnits");
    run.add("newlineSequences", Json.strings(List.of("\r\n", "\n", "\r")));
    run.add(
        "originalUriBaseIds",
        object(ROOT, object("description", text("the folder the check was started in"))));
    run.add("invocations", Json.array(List.of(review), each -> invocation()));
    run.add("artifacts", Json.array(review.sheets(), this::artifact));
    JsonArray results = new JsonArray();
    for (Reviewed sheet : review.sheets()) {
      sheet.findings().stream()
          .filter(finding -> ruleIndex.containsKey(finding.name()))
          .forEach(finding -> results.add(result(sheet, finding)));
    }
    run.add("results", results);
    return run;
  }

  private JsonObject driver() {
    JsonObject driver = new JsonObject();
    driver.addProperty("name", "settlewell");
    driver.addProperty("version", review.version());
    driver.addProperty("semanticVersion", review.version());
    driver.add("rules", Json.array(Catalog.NAMES, FindingsSarif::rule));
    return driver;
  }

  private static JsonObject rule(String name) {
    JsonObject rule = new JsonObject();
    rule.addProperty("id", name);
    for (Check check : Catalog.CHECKS) {
      if (check.name().equals(name)) {
        rule.add("shortDescription", text(check.summary()));
        rule.add("defaultConfiguration", level(check.severity()));
      }
    }
    Pages.of(name)
        .ifPresent(
            page -> {
              rule.add("fullDescription", text(page.summary()));
              JsonObject help = text(page.text());
              help.addProperty("markdown", page.text());
              rule.add("help", help);
            });
    return rule;
  }

  private static JsonObject level(Severity severity) {
    JsonObject configuration = new JsonObject();
    configuration.addProperty("level", levelOf(severity));
    return configuration;
  }

  private static String levelOf(Severity severity) {
    return switch (severity) {
      case ERROR -> "error";
      case WARNING -> "warning";
      case INFORMATION, HINT -> "note";
      case OFF -> "none";
    };
  }

  private JsonObject invocation() {
    JsonArray notifications = new JsonArray();
    review.failures().forEach(failure -> notifications.add(unread(failure)));
    for (Reviewed sheet : review.sheets()) {
      sheet.findings().stream()
          .filter(finding -> finding.name().equals(Findings.INTERNAL_FAULT))
          .forEach(finding -> notifications.add(fault(finding)));
    }
    JsonObject invocation = new JsonObject();
    invocation.addProperty("executionSuccessful", notifications.isEmpty());
    if (!notifications.isEmpty()) {
      invocation.add("toolExecutionNotifications", notifications);
    }
    return invocation;
  }

  private JsonObject unread(Review.Failure failure) {
    JsonObject notification = new JsonObject();
    notification.addProperty("level", "error");
    notification.add("message", text(failure.path() + ": " + failure.message()));
    return notification;
  }

  private JsonObject fault(Finding finding) {
    JsonObject notification = new JsonObject();
    notification.addProperty("level", "error");
    notification.add("message", text(finding.message()));
    notification.add(
        "locations",
        Json.array(List.of(finding.place()), place -> object("physicalLocation", physical(place))));
    return notification;
  }

  private JsonObject artifact(Reviewed sheet) {
    JsonObject artifact = object("location", artifactLocation(sheet.path()));
    artifact.addProperty("encoding", "UTF-8");
    artifact.add("hashes", hashes(sheet));
    return artifact;
  }

  private static JsonObject hashes(Reviewed sheet) {
    JsonObject hashes = new JsonObject();
    hashes.addProperty("sha-256", Digest.of(sheet.text().content()));
    return hashes;
  }

  private JsonObject result(Reviewed sheet, Finding finding) {
    boolean judged = !finding.name().equals(Summary.NOT_COMPUTED);
    JsonObject result = new JsonObject();
    result.addProperty("ruleId", finding.name());
    result.addProperty("ruleIndex", ruleIndex.get(finding.name()));
    result.addProperty("kind", judged ? "fail" : "open");
    result.addProperty("level", judged ? levelOf(finding.severity()) : "none");
    result.add("message", text(message(finding)));
    result.add("locations", Json.array(List.of(finding), this::location));
    JsonArray related = new JsonArray();
    for (Related other : finding.related()) {
      related.add(related(other, related.size()));
    }
    if (!related.isEmpty()) {
      result.add("relatedLocations", related);
    }
    result.add("partialFingerprints", fingerprints(sheet, finding));
    result.add(
        "suppressions",
        Json.array(
            finding.acceptance().stream().toList(),
            a -> {
              JsonObject suppression = new JsonObject();
              suppression.addProperty("kind", "inSource");
              suppression.addProperty("status", "accepted");
              suppression.addProperty("justification", a.because());
              suppression.add("location", object("physicalLocation", physical(a.place())));
              return suppression;
            }));
    List<Fix> remedies = sheet.remedies().getOrDefault(finding, List.of());
    Json.arrayIfAny(result, "fixes", remedies, this::fix);
    return result;
  }

  /** The sentence, and under it the rows of figures, for viewers show nothing else. */
  private static String message(Finding finding) {
    StringBuilder message = new StringBuilder(finding.message());
    finding
        .facts()
        .forEach(
            fact -> message.append('\n').append(fact.label()).append(": ").append(fact.text()));
    return message.toString();
  }

  private JsonObject location(Finding finding) {
    JsonObject location = object("physicalLocation", physical(finding.place()));
    if (!finding.subject().isEmpty()) {
      JsonObject logical = new JsonObject();
      logical.addProperty("name", finding.subject());
      location.add("logicalLocations", Json.array(List.of(logical), each -> each));
    }
    return location;
  }

  private JsonObject related(Related related, int id) {
    JsonObject location = new JsonObject();
    location.addProperty("id", id);
    location.add("physicalLocation", physical(related.place()));
    location.add("message", text(related.message()));
    return location;
  }

  private JsonObject physical(Place place) {
    JsonObject physical = object("artifactLocation", artifactLocation(place.sheet()));
    locations
        .of(place, PositionEncoding.UTF_16)
        .ifPresent(at -> physical.add("region", region(at)));
    return physical;
  }

  private static JsonObject region(Location at) {
    JsonObject region = new JsonObject();
    region.addProperty("startLine", at.line());
    region.addProperty("startColumn", at.column());
    region.addProperty("endLine", at.endLine());
    region.addProperty("endColumn", at.endColumn());
    return region;
  }

  private static JsonObject artifactLocation(String path) {
    JsonObject location = new JsonObject();
    location.addProperty("uri", UriReference.of(path));
    if (!UriReference.isAbsolute(path)) {
      location.addProperty("uriBaseId", ROOT);
    }
    return location;
  }

  /**
   * What stays the same when lines move: the finding's name, what it is about, and for a finding of
   * the text the value itself; a number tells equal ones apart.
   */
  private JsonObject fingerprints(Reviewed sheet, Finding finding) {
    String value = finding.subject().isEmpty() ? locations.written(finding.place()) : "";
    String what =
        String.join(
            "\u0000", sheet.path(), finding.name(), finding.subject(), finding.about(), value);
    int number = seen.merge(what, 1, Integer::sum);
    JsonObject fingerprints = new JsonObject();
    fingerprints.addProperty(FINGERPRINT, Digest.of(what).substring(0, 32) + ":" + number);
    return fingerprints;
  }

  private JsonObject fix(Fix fix) {
    Map<String, JsonArray> bySheet = new LinkedHashMap<>();
    for (Edit edit : fix.edits()) {
      bySheet.computeIfAbsent(edit.place().sheet(), path -> new JsonArray()).add(replacement(edit));
    }
    JsonArray changes = new JsonArray();
    bySheet.forEach(
        (path, replacements) -> {
          JsonObject change = object("artifactLocation", artifactLocation(path));
          change.add("replacements", replacements);
          changes.add(change);
        });
    JsonObject object = object("description", text(fix.title()));
    object.add("artifactChanges", changes);
    return object;
  }

  private JsonObject replacement(Edit edit) {
    JsonObject replacement = new JsonObject();
    locations
        .of(edit.place(), PositionEncoding.UTF_16)
        .ifPresent(at -> replacement.add("deletedRegion", region(at)));
    replacement.add("insertedContent", text(edit.replacement()));
    return replacement;
  }

  private static JsonObject text(String text) {
    JsonObject object = new JsonObject();
    object.addProperty("text", text);
    return object;
  }

  private static JsonObject object(String key, JsonObject value) {
    JsonObject object = new JsonObject();
    object.add(key, value);
    return object;
  }
}
