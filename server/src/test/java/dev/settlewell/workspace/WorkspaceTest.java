package dev.settlewell.workspace;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.sheet.Linked;
import dev.settlewell.text.Problem;
import dev.settlewell.vocabulary.Vocabulary;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WorkspaceTest {
  private static final LocalDate DAY = LocalDate.of(2026, 12, 1);
  private static final String HEAD = "channel-sheet: 1\n";

  private final InMemory files = new InMemory();
  private final Memo memo = new Memo(Vocabulary.load());

  private Workspace read(String... paths) {
    return Workspace.read(List.of(paths), files, DAY, memo);
  }

  private List<String> problems(String path) {
    return read(path).find(path).orElseThrow().problems().stream()
        .map(problem -> problem.kind() + " " + problem.message())
        .toList();
  }

  private static List<Problem.Kind> kinds(Linked linked) {
    return linked.problems().stream().map(Problem::kind).toList();
  }

  @Test
  void brings_in_supplies_converters_and_interferers_transitively_but_no_channels() {
    files
        .with("/w/.git/HEAD", "")
        .with("/w/a/a.channels.yaml", HEAD + "use: [../b/b.channels.yaml]\n")
        .with("/w/b/b.channels.yaml", HEAD + "use: [c.channels.yaml]\nsupplies: {ref: 2 V}\n")
        .with(
            "/w/b/c.channels.yaml",
            HEAD
                + "converters: {adc: {bits: 12, reference: 2 V}}\n"
                + "interferers: {mains: {frequency: 50 Hz}}\n"
                + "channels: {x: {measures: 0 V to 1 V, sensor: {voltage: {}}}}\n");
    Linked a = read("/w/a/a.channels.yaml").find("/w/a/a.channels.yaml").orElseThrow();
    assertThat(a.problems()).isEmpty();
    assertThat(a.supplies()).containsOnlyKeys("ref");
    assertThat(a.converters()).containsOnlyKeys("adc");
    assertThat(a.interferers()).containsOnlyKeys("mains");
    assertThat(a.used())
        .extracting(sheet -> sheet.path())
        .containsExactly("/w/b/b.channels.yaml", "/w/b/c.channels.yaml");
  }

  @Test
  void the_workspace_ends_at_the_repository_or_the_project_file() {
    files
        .with("/w/.git/HEAD", "")
        .with("/out.channels.yaml", HEAD)
        .with("/w/a/a.channels.yaml", HEAD + "use: [../../out.channels.yaml]\n");
    assertThat(problems("/w/a/a.channels.yaml"))
        .singleElement()
        .asString()
        .startsWith("USE_OUTSIDE_WORKSPACE");
    files.with("/.settlewell.yaml", "");
    assertThat(problems("/w/a/a.channels.yaml"))
        .as("the nearest mark decides")
        .singleElement()
        .asString()
        .startsWith("USE_OUTSIDE");
    files.files.remove("/w/.git/HEAD");
    assertThat(problems("/w/a/a.channels.yaml")).isEmpty();
  }

  @Test
  void without_a_mark_the_workspace_is_the_sheets_own_folder() {
    files
        .with("/w/b.channels.yaml", HEAD)
        .with("/w/a/sub/c.channels.yaml", HEAD)
        .with("/w/a/a.channels.yaml", HEAD + "use: [../b.channels.yaml, sub/c.channels.yaml]\n");
    assertThat(problems("/w/a/a.channels.yaml"))
        .singleElement()
        .asString()
        .startsWith("USE_OUTSIDE_WORKSPACE `../b.channels.yaml`");
  }

  @Test
  void a_missing_sheet_is_said_once_and_its_names_are_not_called_unknown() {
    files.with(
        "/w/a.channels.yaml",
        HEAD
            + "use: [gone.channels.yaml]\n"
            + "converters: {adc: {bits: 12, reference: ref}}\n"
            + "scans: {s: {converter: adc, rate: 1 Hz, order: [nothing]}}\n");
    assertThat(problems("/w/a.channels.yaml"))
        .containsExactly(
            "USE_NOT_FOUND `/w/gone.channels.yaml`: there is no such file",
            "UNKNOWN_NAME no channel is named `nothing`");
  }

  @Test
  void circles_are_told_with_their_way() {
    files
        .with("/w/a.channels.yaml", HEAD + "use: [b.channels.yaml]\n")
        .with("/w/b.channels.yaml", HEAD + "use: [./c.channels.yaml]\n")
        .with("/w/c.channels.yaml", HEAD + "use: [../w/a.channels.yaml]\n")
        .with("/w/self.channels.yaml", HEAD + "use: [self.channels.yaml]\n");
    assertThat(problems("/w/a.channels.yaml"))
        .containsExactly(
            "USE_CIRCLE sheets may not use each other in a circle: a.channels.yaml uses"
                + " b.channels.yaml, which uses c.channels.yaml, which uses a.channels.yaml");
    assertThat(problems("/w/self.channels.yaml"))
        .singleElement()
        .asString()
        .startsWith("USE_CIRCLE");
  }

  @Test
  void a_name_defined_twice_points_at_both() {
    files
        .with("/w/a.channels.yaml", HEAD + "use: [b.channels.yaml]\nsupplies: {ref: 1 V}\n")
        .with("/w/b.channels.yaml", HEAD + "interferers: {ref: {frequency: 50 Hz}}\n");
    Linked a = read("/w/a.channels.yaml").find("/w/a.channels.yaml").orElseThrow();
    assertThat(kinds(a)).containsExactly(Problem.Kind.DUPLICATE_NAME);
    assertThat(a.problems().get(0).related())
        .extracting(related -> related.place().sheet())
        .containsExactly("/w/a.channels.yaml", "/w/b.channels.yaml");
  }

  @Test
  void two_ways_to_one_sheet_are_one_sheet() {
    files
        .with("/w/a.channels.yaml", HEAD + "use: [b.channels.yaml, c.channels.yaml]\n")
        .with("/w/b.channels.yaml", HEAD + "use: [c.channels.yaml]\n")
        .with("/w/c.channels.yaml", HEAD + "supplies: {ref: 1 V}\n");
    assertThat(problems("/w/a.channels.yaml")).isEmpty();
    assertThat(read("/w/a.channels.yaml").find("/w/a.channels.yaml").orElseThrow().used())
        .hasSize(2);
  }

  @Test
  void what_did_not_change_is_the_same_object_and_what_did_is_not() {
    files
        .with("/w/a.channels.yaml", HEAD + "use: [b.channels.yaml]\n")
        .with("/w/b.channels.yaml", HEAD + "supplies: {ref: 1 V}\n")
        .with("/w/lone.channels.yaml", HEAD);
    String[] all = {"/w/a.channels.yaml", "/w/b.channels.yaml", "/w/lone.channels.yaml"};
    Workspace before = read(all);
    assertThat(read(all).find(all[0])).containsSame(before.find(all[0]).orElseThrow());
    files.with("/w/b.channels.yaml", HEAD + "supplies: {ref: 2 V}\n");
    Workspace after = read(all);
    assertThat(after.find(all[0]).orElseThrow()).isNotSameAs(before.find(all[0]).orElseThrow());
    assertThat(after.find(all[0]).orElseThrow().sheet())
        .isSameAs(before.find(all[0]).orElseThrow().sheet());
    assertThat(after.find(all[2])).containsSame(before.find(all[2]).orElseThrow());
    assertThat(
            after
                .find(all[0])
                .orElseThrow()
                .supplies()
                .get("ref")
                .value()
                .stated()
                .orElseThrow()
                .value())
        .isEqualTo(2);
  }

  @Test
  void an_open_buffer_stands_over_the_disk(@TempDir Path folder) throws IOException {
    write(folder.resolve("a.channels.yaml"), HEAD + "use: [sub/b.channels.yaml]\n");
    write(folder.resolve("sub/b.channels.yaml"), HEAD + "supplies: {ref: 1 V}\n");
    SheetReader disk = new DiskReader(folder);
    Workspace saved = Workspace.read(List.of("a.channels.yaml"), disk, DAY, memo);
    assertThat(saved.find("a.channels.yaml").orElseThrow().supplies()).containsOnlyKeys("ref");
    SheetReader edited =
        new Overlay(Map.of("sub/b.channels.yaml", HEAD + "supplies: {other: 1 V}\n"), disk);
    Workspace draft = Workspace.read(List.of("a.channels.yaml"), edited, DAY, memo);
    assertThat(draft.find("a.channels.yaml").orElseThrow().supplies()).containsOnlyKeys("other");
  }

  @Test
  void the_disk_knows_roots_above_the_folder_it_is_asked_from(@TempDir Path folder)
      throws IOException {
    Files.createDirectories(folder.resolve(".git"));
    write(folder.resolve("b/b.channels.yaml"), HEAD + "use: [../a/a.channels.yaml]\n");
    write(folder.resolve("a/a.channels.yaml"), HEAD + "use: [../b/b.channels.yaml, none.yaml]\n");
    Workspace workspace =
        Workspace.read(List.of("a.channels.yaml"), new DiskReader(folder.resolve("a")), DAY, memo);
    Linked a = workspace.find("a.channels.yaml").orElseThrow();
    assertThat(kinds(a))
        .containsExactlyInAnyOrder(Problem.Kind.USE_CIRCLE, Problem.Kind.USE_NOT_FOUND);
    assertThat(a.used()).extracting(sheet -> sheet.path()).containsExactly("../b/b.channels.yaml");
  }

  @Test
  void a_link_out_of_the_workspace_is_outside(@TempDir Path folder) throws IOException {
    write(folder.resolve("far/far.channels.yaml"), HEAD);
    write(folder.resolve("w/a.channels.yaml"), HEAD + "use: [near.channels.yaml]\n");
    Files.createSymbolicLink(
        folder.resolve("w/near.channels.yaml"), folder.resolve("far/far.channels.yaml"));
    Workspace workspace =
        Workspace.read(List.of("w/a.channels.yaml"), new DiskReader(folder), DAY, memo);
    assertThat(kinds(workspace.find("w/a.channels.yaml").orElseThrow()))
        .containsExactly(Problem.Kind.USE_OUTSIDE_WORKSPACE);
  }

  @Test
  void what_cannot_be_read_says_why(@TempDir Path folder) throws IOException {
    Files.write(folder.resolve("latin.channels.yaml"), new byte[] {'a', (byte) 0xE9, 'b'});
    Workspace workspace =
        Workspace.read(
            List.of("latin.channels.yaml", "none.channels.yaml", "."),
            new DiskReader(folder),
            DAY,
            memo);
    assertThat(workspace.unreadable())
        .containsEntry("latin.channels.yaml", "it is not UTF-8")
        .containsEntry("none.channels.yaml", "there is no such file")
        .containsEntry(".", "it is no file");
  }

  @Test
  void sources_of_firmware_come_with_the_sheet_and_stay_inside_the_workspace() {
    files
        .with("/w/.git/HEAD", "")
        .with("/etc/other.h", "#define X 1")
        .with("/w/src/a.h", "#define X 1")
        .with(
            "/w/doc/a.channels.yaml",
            HEAD
                + "firmware:\n"
                + "  - {constant: X, in: ../src/a.h, equals: c.lsb}\n"
                + "  - {constant: X, in: ../src/none.h, equals: c.lsb}\n"
                + "  - {constant: X, in: ../../etc/other.h, equals: c.lsb}\n");
    String path = "/w/doc/a.channels.yaml";
    Linked first = read(path).find(path).orElseThrow();
    assertThat(first.sources().get("../src/a.h").text().orElseThrow().name())
        .isEqualTo("/w/src/a.h");
    assertThat(first.sources().get("../src/none.h").why()).isEqualTo("there is no such file");
    assertThat(first.sources().get("../../etc/other.h").why())
        .isEqualTo("it lies outside the workspace");
    assertThat(read(path).find(path)).containsSame(first);
    files.with("/w/src/a.h", "#define X 2");
    assertThat(read(path).find(path).orElseThrow()).isNotSameAs(first);
  }

  @Test
  void discovery_skips_what_is_hidden_built_or_fetched(@TempDir Path folder) throws IOException {
    for (String path :
        List.of(
            "z.channels.yaml",
            "a/b.channels.yaml",
            "a/plain.yaml",
            ".git/x.channels.yaml",
            "target/x.channels.yaml",
            "web/node_modules/p/x.channels.yaml",
            ".channels.yaml")) {
      write(folder.resolve(path), HEAD);
    }
    Discovery found = Discovery.below(List.of(folder, folder.resolve("a/plain.yaml")));
    assertThat(found.sheets())
        .containsExactly(
            folder.resolve("a/b.channels.yaml"),
            folder.resolve("a/plain.yaml"),
            folder.resolve("z.channels.yaml"));
    assertThat(found.complete()).isTrue();
  }

  private static void write(Path file, String text) throws IOException {
    Files.createDirectories(file.getParent());
    Files.write(file, text.getBytes(StandardCharsets.UTF_8));
  }
}
