package dev.settlewell.command;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import dev.settlewell.HeldAgainst;
import dev.settlewell.finding.catalog.Catalog;
import java.io.IOException;
import java.io.StringReader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.TimeZone;
import java.util.stream.StreamSupport;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.w3c.dom.Element;
import org.xml.sax.InputSource;

/** The outputs that other programs read, held against their schemas. */
class FormatsTest {
  /** Schema of the OASIS standard SARIF 2.1.0; its source stands beside it. */
  private static final String SARIF = "/dev/settlewell/review/sarif-2.1.0.json";

  private static final String FINDINGS = "/dev/settlewell/schema/findings.schema.json";
  private static final String FIGURES = "/dev/settlewell/schema/figures.schema.json";

  @TempDir private Path folder;

  @BeforeEach
  void write() throws IOException {
    Files.createDirectories(folder.resolve("mast é"));
    write("mast é/hasty.channels.yaml", Boards.HASTY);
    write("misspelt.channels.yaml", Boards.MISSPELT);
    write("part.channels.yaml", Boards.INCOMPLETE);
    write(
        "meant.channels.yaml",
        Boards.HASTY
            + "    accept:\n"
            + "      - {finding: acquisition-too-short, because: a trial board}\n");
  }

  private void write(String name, String text) throws IOException {
    Files.writeString(folder.resolve(name), text);
  }

  private String out(String... words) {
    return Typed.in(folder, words).out();
  }

  @Test
  void jsonKeepsToItsSchema() {
    assertThat(HeldAgainst.schema(FINDINGS, out("check", "--format=json"))).isEmpty();
    assertThat(HeldAgainst.schema(FINDINGS, out("check", "gone", "--format=json"))).isEmpty();
    assertThat(HeldAgainst.schema(FINDINGS, "{\"form\": 2}")).isNotEmpty();
  }

  @Test
  void figuresKeepToTheirSchema() {
    assertThat(HeldAgainst.schema(FIGURES, out("figures", "--format=json"))).isEmpty();
    assertThat(HeldAgainst.schema(FIGURES, "{\"form\": 1}")).isNotEmpty();
  }

  @Test
  void sarifKeepsToTheStandardsSchema() {
    String sarif = out("check", "--format=sarif");
    assertThat(HeldAgainst.schema(SARIF, sarif)).isEmpty();
    assertThat(HeldAgainst.schema(SARIF, out("check", "gone", "--format=sarif"))).isEmpty();
    assertThat(HeldAgainst.schema(SARIF, sarif.replace("\"2.1.0\"", "\"2.0.0\""))).isNotEmpty();
  }

  @Test
  void sarifSaysWhatImportersAskFor() {
    JsonObject run = run(out("check", "--format=sarif"));
    assertThat(run.get("columnKind").getAsString()).isEqualTo("utf16CodeUnits");
    JsonArray rules = run.getAsJsonObject("tool").getAsJsonObject("driver").getAsJsonArray("rules");
    assertThat(rules).extracting(rule -> text(rule, "id")).isEqualTo(Catalog.NAMES);
    for (JsonElement result : run.getAsJsonArray("results")) {
      int index = result.getAsJsonObject().get("ruleIndex").getAsInt();
      assertThat(text(rules.get(index), "id")).isEqualTo(text(result, "ruleId"));
      JsonObject region = physical(result).getAsJsonObject("region");
      assertThat(region.get("startLine").getAsInt()).isPositive();
      String uri = text(physical(result).get("artifactLocation"), "uri");
      assertThat(uri).matches("[A-Za-z0-9._~%/-]+");
      assertThat(result.getAsJsonObject().getAsJsonObject("partialFingerprints").size())
          .isPositive();
    }
    assertThat(run.getAsJsonArray("results"))
        .extracting(result -> text(physical(result).get("artifactLocation"), "uri"))
        .contains("mast%20%C3%A9/hasty.channels.yaml");
  }

  @Test
  void sarifLeavesOpenWhatCouldNotBeJudged() {
    JsonObject open = result("part.channels.yaml", "not-computed");
    assertThat(text(open, "kind")).isEqualTo("open");
    assertThat(text(open, "level")).isEqualTo("none");
  }

  @Test
  void sarifSuppressesWhatTheSheetAccepts() {
    JsonObject accepted = result("meant.channels.yaml", "acquisition-too-short");
    JsonElement suppression = accepted.getAsJsonArray("suppressions").get(0);
    assertThat(text(suppression, "justification")).isEqualTo("a trial board");
    assertThat(text(suppression, "status")).isEqualTo("accepted");
  }

  @Test
  void sarifFixesPutTheRightTextInTheRightPlace() {
    JsonObject misspelt = result("misspelt.channels.yaml", "wrong-unit");
    JsonObject replacement =
        misspelt
            .getAsJsonArray("fixes")
            .get(0)
            .getAsJsonObject()
            .getAsJsonArray("artifactChanges")
            .get(0)
            .getAsJsonObject()
            .getAsJsonArray("replacements")
            .get(0)
            .getAsJsonObject();
    assertThat(mended(Boards.MISSPELT, replacement)).isEqualTo(Boards.CLEAN);
  }

  /** Lines and columns of SARIF, by the letter of its section 3.30, without our own index. */
  private static String mended(String text, JsonObject replacement) {
    JsonObject region = replacement.getAsJsonObject("deletedRegion");
    String[] lines = text.split("\n", -1);
    int line = region.get("startLine").getAsInt() - 1;
    assertThat(region.get("endLine").getAsInt() - 1).isEqualTo(line);
    lines[line] =
        lines[line].substring(0, region.get("startColumn").getAsInt() - 1)
            + text(replacement.get("insertedContent"), "text")
            + lines[line].substring(region.get("endColumn").getAsInt() - 1);
    return String.join("\n", lines);
  }

  @Test
  void fingerprintsOutliveLinesThatMove() throws IOException {
    String before = fingerprint(result("mast é/hasty.channels.yaml", "acquisition-too-short"));
    write("mast é/hasty.channels.yaml", Boards.HASTY.replace("ambient:", "\n# moved\n\nambient:"));
    String after = fingerprint(result("mast é/hasty.channels.yaml", "acquisition-too-short"));
    assertThat(after).isEqualTo(before);
  }

  private static String fingerprint(JsonObject result) {
    return result.getAsJsonObject("partialFingerprints").toString();
  }

  @Test
  void whatWasNotReadMakesTheRunUnsuccessful() {
    JsonObject invocation =
        run(out("check", "gone", "--format=sarif"))
            .getAsJsonArray("invocations")
            .get(0)
            .getAsJsonObject();
    assertThat(invocation.get("executionSuccessful").getAsBoolean()).isFalse();
    assertThat(invocation.toString()).contains("there is no such file");
  }

  @Test
  void junitCountsWhatItHolds() throws Exception {
    String xml = out("check", "--format=junit");
    Element root =
        DocumentBuilderFactory.newInstance()
            .newDocumentBuilder()
            .parse(new InputSource(new StringReader(xml)))
            .getDocumentElement();
    var suites = root.getElementsByTagName("testsuite");
    assertThat(suites.getLength()).isEqualTo(4);
    for (int i = 0; i < suites.getLength(); i++) {
      Element suite = (Element) suites.item(i);
      for (var counted : List.of("failure:failures", "skipped:skipped", "testcase:tests")) {
        String[] names = counted.split(":");
        assertThat(Integer.parseInt(suite.getAttribute(names[1])))
            .as("%s of %s", names[1], suite.getAttribute("name"))
            .isEqualTo(suite.getElementsByTagName(names[0]).getLength());
      }
    }
    assertThat(xml).contains("<failure").contains("<skipped");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "check",
        "check --format=json",
        "check --format=sarif",
        "check --help",
        "figures",
        "figures --format=json",
        "explain",
        "check --format=junit"
      })
  void theSameBytesOnEveryMachine(String words) {
    Locale locale = Locale.getDefault();
    TimeZone zone = TimeZone.getDefault();
    try {
      Locale.setDefault(Locale.ROOT);
      String plain = out(words.split(" "));
      for (String tag : List.of("tr-TR", "ar-EG-u-nu-arab")) {
        Locale.setDefault(Locale.forLanguageTag(tag));
        TimeZone.setDefault(TimeZone.getTimeZone("Pacific/Kiritimati"));
        assertThat(out(words.split(" "))).as(tag).isEqualTo(plain);
      }
    } finally {
      Locale.setDefault(locale);
      TimeZone.setDefault(zone);
    }
  }

  private JsonObject result(String path, String rule) {
    JsonArray results = run(out("check", path, "--format=sarif")).getAsJsonArray("results");
    return StreamSupport.stream(results.spliterator(), false)
        .map(JsonElement::getAsJsonObject)
        .filter(result -> text(result, "ruleId").equals(rule))
        .findFirst()
        .orElseThrow();
  }

  private static JsonObject physical(JsonElement result) {
    return result
        .getAsJsonObject()
        .getAsJsonArray("locations")
        .get(0)
        .getAsJsonObject()
        .getAsJsonObject("physicalLocation");
  }

  private static JsonObject run(String sarif) {
    return JsonParser.parseString(sarif)
        .getAsJsonObject()
        .getAsJsonArray("runs")
        .get(0)
        .getAsJsonObject();
  }

  private static String text(JsonElement object, String key) {
    return object.getAsJsonObject().get(key).getAsString();
  }
}
