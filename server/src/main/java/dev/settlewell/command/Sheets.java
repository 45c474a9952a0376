package dev.settlewell.command;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.finding.Remedies;
import dev.settlewell.review.Review;
import dev.settlewell.review.Reviewed;
import dev.settlewell.sheet.Linked;
import dev.settlewell.text.Fix;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.Discovery;
import dev.settlewell.workspace.DiskReader;
import dev.settlewell.workspace.Memo;
import dev.settlewell.workspace.Overlay;
import dev.settlewell.workspace.ProjectFile;
import dev.settlewell.workspace.SheetReader;
import dev.settlewell.workspace.Workspace;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** The sheets a command was asked about, read, computed and judged. */
final class Sheets {
  /** The argument that stands for the standard input. */
  static final String STANDARD_INPUT = "-";

  private final Console console;
  private final LocalDate date;
  private final Memo memo = new Memo(Vocabulary.load());
  private final Map<String, String> overlay = new HashMap<>();

  Sheets(Console console, LocalDate date) {
    this.console = console;
    this.date = date;
  }

  /** The settings of the project that the tool was started in. */
  ProjectFile project() {
    return ProjectFile.above("", reader());
  }

  /**
   * @param arguments files, folders or {@code -}; none is the present folder
   * @param standardInputName the path that the text of the standard input is taken to stand at
   * @throws InputException where nothing is there to be read
   */
  Review review(List<String> arguments, String standardInputName) throws InputException {
    List<String> paths = paths(arguments, standardInputName);
    Workspace workspace = Workspace.read(paths, reader(), date, memo);
    List<Reviewed> sheets = new ArrayList<>();
    List<Review.Failure> failures = new ArrayList<>();
    workspace.unreadable().forEach((path, why) -> failures.add(new Review.Failure(path, why)));
    workspace.sheets().values().forEach(linked -> sheets.add(judge(linked, failures)));
    return new Review(sheets, failures, console.version(), date);
  }

  /** The same report, each finding with the ways to mend it that were shown to help. */
  Review withRemedies(Review review) {
    List<Reviewed> sheets =
        review.sheets().stream()
            .map(s -> new Reviewed(s.analysis(), s.findings(), remedies(s)))
            .toList();
    return new Review(sheets, review.failures(), review.version(), review.date());
  }

  private Map<Finding, List<Fix>> remedies(Reviewed sheet) {
    Map<Finding, List<Fix>> remedies = new LinkedHashMap<>();
    for (Finding finding : sheet.open()) {
      List<Fix> offered = offered(sheet, finding);
      if (!offered.isEmpty()) {
        remedies.put(finding, offered);
      }
    }
    return remedies;
  }

  List<Fix> offered(Reviewed sheet, Finding finding) {
    return Remedies.offered(
        sheet.text(), finding, sheet.findings(), content -> with(sheet.path(), content).findings());
  }

  /** The sheet as it would be with another text; what it uses stays as it is. */
  Reviewed with(String path, String content) {
    SheetReader reader = new Overlay(Map.of(path, content), reader());
    Linked linked = Workspace.read(List.of(path), reader, date, memo).find(path).orElseThrow();
    return judge(linked, new ArrayList<>());
  }

  private SheetReader reader() {
    return new Overlay(overlay, new DiskReader(console.folder()));
  }

  /** A fault while computing costs this sheet its figures, and nothing else. */
  private static Reviewed judge(Linked linked, List<Review.Failure> failures) {
    Analysis analysis;
    try {
      analysis = Analyzer.analyze(linked);
    } catch (RuntimeException | StackOverflowError fault) {
      failures.add(new Review.Failure(linked.sheet().path(), Faults.sentence(fault)));
      analysis = new Analysis(linked, Map.of(), Map.of(), Map.of());
    }
    return new Reviewed(analysis, Findings.of(analysis));
  }

  private List<String> paths(List<String> arguments, String standardInputName)
      throws InputException {
    List<Path> files = new ArrayList<>();
    List<String> paths = new ArrayList<>();
    for (String argument : arguments.isEmpty() ? List.of(".") : arguments) {
      if (argument.equals(STANDARD_INPUT)) {
        String name = shown(path(standardInputName));
        overlay.put(name, standardInput());
        paths.add(name);
      } else {
        files.add(path(argument));
      }
    }
    Discovery found = Discovery.below(files);
    if (!found.complete()) {
      new Output(console).note("not every folder was searched: some are too deep or unreadable");
    }
    found.sheets().forEach(file -> paths.add(shown(file)));
    if (paths.isEmpty()) {
      throw new InputException(
          "no channel sheet (NAME.channels.yaml) in "
              + (arguments.isEmpty() ? "this folder" : String.join(", ", arguments)));
    }
    return paths.stream().distinct().toList();
  }

  private Path path(String argument) throws InputException {
    try {
      return console.folder().resolve(argument).normalize();
    } catch (InvalidPathException e) {
      throw new InputException("no path: " + argument);
    }
  }

  /** Relative to where the tool was started wherever that is possible, with {@code /}. */
  private String shown(Path file) {
    boolean sameRoot = Objects.equals(file.getRoot(), console.folder().getRoot());
    Path shown = sameRoot ? console.folder().normalize().relativize(file) : file;
    return shown.toString().replace('\\', '/');
  }

  private String standardInput() throws InputException {
    try {
      byte[] bytes = console.in().readAllBytes();
      return StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
    } catch (CharacterCodingException e) {
      throw new InputException("the standard input is not UTF-8");
    } catch (IOException e) {
      throw new InputException("the standard input cannot be read");
    }
  }
}
