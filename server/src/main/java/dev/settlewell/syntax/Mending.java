package dev.settlewell.syntax;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeMap;

/**
 * What the scanners of one reading share: the text, the draft they patch, and what they found. Also
 * the few questions about characters that all of them ask.
 */
final class Mending {
  final SourceText text;
  final Draft draft;
  final Set<String> textKeys;
  final List<Problem> problems = new ArrayList<>();

  /** What was blanked out of the draft in place of a value, by its start. */
  final TreeMap<Integer, Span> broken = new TreeMap<>();

  /** Quoted and block scalars: tabs in them are meant. */
  final List<Span> verbatim = new ArrayList<>();

  /** Lists, mappings and quoted texts that can only be taken out as a whole. */
  final List<Span> wholes = new ArrayList<>();

  /** The line that is being read; a value that goes on over lines moves it to its last. */
  int line;

  private final int[] indents;

  Mending(SourceText text, Set<String> textKeys) {
    this.text = text;
    this.textKeys = textKeys;
    this.draft = new Draft(text.content());
    this.indents = new int[text.lineCount()];
  }

  /** A line as the scanners see it; {@code end} is behind its last character that is no blank. */
  record Row(int number, int start, int content, int end, int indent) {}

  Row row(int number) {
    Span line = text.line(number);
    int start = line.start();
    if (start == 0 && text.content().startsWith("\uFEFF")) {
      start = 1;
    }
    int content = start;
    while (content < line.end() && (blank(content) || draft.isDropped(content))) {
      content++;
    }
    int end = line.end();
    while (end > content && blank(end - 1)) {
      end--;
    }
    int indent = indents[number] > 0 ? indents[number] - 1 : content - start;
    return new Row(number, start, content, end, indent);
  }

  /** What the indentation of a line with tabs in it is taken for. */
  void setIndent(Row row, int indent) {
    indents[row.number()] = indent + 1;
    draft.drop(row.start(), row.content());
    draft.indent(row.content(), indent);
  }

  /** Blank, or nothing but a comment. */
  boolean empty(Row row) {
    return row.content() >= row.end() || draft.at(row.content()) == '#';
  }

  /** The next line with content; -1 behind the last. */
  int nextContent(int number) {
    int next = number + 1;
    while (next < text.lineCount() && empty(row(next))) {
      next++;
    }
    return next < text.lineCount() ? next : -1;
  }

  boolean blank(int offset) {
    char c = draft.at(offset);
    return c == ' ' || c == '\t';
  }

  /** True where a blank or the line's end stands. */
  boolean gap(int offset) {
    char c = draft.at(offset);
    return c == ' ' || c == '\t' || c == '\n' || c == '\r';
  }

  /** True where a comment starts: a {@code #} behind a blank. */
  boolean comment(int offset) {
    return draft.at(offset) == '#' && (offset == 0 || gap(offset - 1));
  }

  int skipBlanks(int offset) {
    int at = offset;
    while (at < draft.length() && blank(at)) {
      at++;
    }
    return at;
  }

  /** The end of what stands between two offsets, without blanks behind it. */
  int trimmed(int start, int end) {
    int at = end;
    while (at > start && gap(at - 1)) {
      at--;
    }
    return at;
  }

  /**
   * Where the text of a line ends that began at {@code from}: before its comment, if it has one.
   */
  int beforeComment(int from, int end) {
    for (int i = from; i < end; i++) {
      if (i > from && comment(i)) {
        return trimmed(from, i);
      }
    }
    return trimmed(from, end);
  }

  /** The colon of {@code word:x}, a key whose colon lacks its blank; -1 where it is none. */
  int tightColon(int from, int end) {
    int at = from;
    while (at < end && wordChar(draft.at(at))) {
      at++;
    }
    boolean word = at > from && draft.at(from) != '-' && draft.at(at) == ':';
    if (!word || at + 1 >= end || gap(at + 1) || draft.at(at + 1) == '/') {
      return -1;
    }
    return at;
  }

  static boolean wordChar(char c) {
    return c >= 'a' && c <= 'z' || c >= '0' && c <= '9' || c == '-';
  }

  String slice(int start, int end) {
    return text.content().substring(start, end);
  }

  /** Reads nothing here, and lets the tree say that something stood here. */
  void breakOff(int start, int end) {
    Span span = new Span(start, Math.max(start, end));
    draft.blank(start, end);
    broken.put(start, span);
  }

  void syntax(int start, int end, String message, Fix... fixes) {
    report(Problem.Kind.SYNTAX, start, end, message, fixes);
  }

  void ambiguous(int start, int end, String message, Fix... fixes) {
    report(Problem.Kind.AMBIGUOUS_TEXT, start, end, message, fixes);
  }

  private void report(Problem.Kind kind, int start, int end, String message, Fix... fixes) {
    Place place = text.place(start, Math.max(start, end));
    problems.add(new Problem(kind, place, message, fixes));
  }

  Edit edit(int start, int end, String replacement) {
    return new Edit(text.place(start, end), replacement);
  }

  /** A fix that writes what is read anyway. */
  Fix safe(String title, Edit... edits) {
    return new Fix(title, List.of(edits), true);
  }

  /** A fix that guesses. */
  Fix guess(String title, Edit... edits) {
    return new Fix(title, List.of(edits), false);
  }

  /** Reads a stretch as if it stood in quotes, and returns the fix that writes them. */
  Fix quote(int start, int end) {
    String mark = quoteMark(start, end);
    draft.insert(start, mark);
    for (int i = start; i < end; i++) {
      if (mark.equals("'") && draft.at(i) == '\'') {
        draft.insert(i, "'");
      }
    }
    draft.insert(end, mark);
    verbatim.add(new Span(start, end));
    return quoteFix(start, end);
  }

  Fix quoteFix(int start, int end) {
    String raw = slice(start, end);
    String mark = quoteMark(start, end);
    String inner = mark.equals("'") ? raw.replace("'", "''") : raw;
    return safe("Put the text in quotes", edit(start, end, mark + inner + mark));
  }

  /** Double quotes, unless the text has characters that mean something inside them. */
  private String quoteMark(int start, int end) {
    String raw = slice(start, end);
    return raw.indexOf('"') < 0 && raw.indexOf('\\') < 0 ? "\"" : "'";
  }
}
