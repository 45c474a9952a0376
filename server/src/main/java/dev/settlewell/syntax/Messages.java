package dev.settlewell.syntax;

/** The YAML parser's complaints in the words of somebody who writes a sheet. */
final class Messages {
  private Messages() {}

  static String of(String complaint) {
    if (complaint.contains("mapping values are not allowed")) {
      return "a second colon, or an indentation that fits nothing above: a text with `: ` in it"
          + " stands in quotes";
    }
    if (complaint.contains("could not find expected ':'")) {
      return "this line has no colon: write `KEY: VALUE`";
    }
    if (complaint.contains("end of stream") && complaint.contains("scalar")) {
      return "this quote is not closed";
    }
    if (complaint.contains("cannot start any token")) {
      return "a value cannot begin like this: put it in quotes";
    }
    if (complaint.contains("escape character")) {
      return "`\\` begins an escape inside double quotes: write `\\\\`, or use single quotes";
    }
    return "this line cannot be read as YAML";
  }

  static String tooDeep() {
    return "nested deeper than " + TreeBuilder.MAX_DEPTH + " levels; nothing in a sheet needs that";
  }
}
