package dev.settlewell.syntax;

/** Values whose first characters mean something else to YAML than to their writer. */
final class Starts {
  private final Mending mending;

  Starts(Mending mending) {
    this.mending = mending;
  }

  /** True where no plain value can begin. */
  static boolean cannotBegin(Mending mending, int at, int end) {
    char c = mending.draft.at(at);
    if (c == '*') {
      return !name(mending, at + 1, end);
    }
    boolean alone = (c == '?' || c == ':' || c == '-') && mending.gap(at + 1);
    return alone || "@`%,]}|>".indexOf(c) >= 0;
  }

  /**
   * True where YAML would fail on this prose, or read it as something else: {@code Rev C: x},
   * {@code [draft] x}, {@code > 5 V}.
   */
  boolean misread(int start, int end) {
    char c = mending.draft.at(start);
    if (c == '&') {
      return !anchorInUse(start, end);
    }
    return c == '!'
        || c == '['
        || c == '{'
        || c == '"'
        || c == '\''
        || cannotBegin(mending, start, end)
        || secondColon(start, end) >= 0;
  }

  /** The first colon that YAML takes for that of a key. */
  int secondColon(int start, int end) {
    for (int i = start; i < end; i++) {
      if (mending.draft.at(i) == ':' && (i + 1 == end || mending.gap(i + 1))) {
        return i;
      }
    }
    return -1;
  }

  /** {@code - 1 V}: a list item to YAML, a negative value to its writer. */
  void dash(int at, int end) {
    int number = mending.skipBlanks(at + 1);
    char c = mending.draft.at(number);
    if (number >= end || c < '0' || c > '9') {
      refuse(at, end);
      return;
    }
    mending.syntax(
        at,
        end,
        "`- " + c + "` begins a list item: write the sign without a blank, `-" + c + "`",
        mending.safe("Remove the blank after the sign", mending.edit(at + 1, number, "")));
    mending.draft.drop(at + 1, number);
  }

  void refuse(int at, int end) {
    String message = "a value cannot begin with `" + mending.draft.at(at) + "`: put it in quotes";
    if (mending.draft.at(at) == '-') {
      message = "a list begins on the line below its key, or stands in brackets: `[…]`";
      mending.syntax(at, end, message);
    } else {
      mending.syntax(at, end, message, mending.quoteFix(at, end));
    }
    mending.breakOff(at, end);
  }

  /** Behind a tag, which is read as if it were not there. */
  int tag(int at) {
    int end = at;
    while (!mending.gap(end) && ",[]{}".indexOf(mending.draft.at(end)) < 0) {
      end++;
    }
    String written = mending.slice(at, end);
    int next = mending.skipBlanks(end);
    mending.syntax(
        at,
        end,
        "`" + written + "` is a tag to YAML and means nothing in a sheet: remove it",
        mending.guess("Remove `" + written + "`", mending.edit(at, next, "")));
    mending.draft.blank(at, end);
    return end;
  }

  /** {@code r25:10 kΩ}: the blank that YAML wants behind the colon of a key. */
  void tightColon(int start, int colon, int end) {
    String key = mending.slice(start, colon);
    mending.syntax(
        start,
        end,
        "a blank is missing after the colon: write `" + key + ": …`",
        mending.safe("Put a blank after the colon", mending.edit(colon + 1, colon + 1, " ")));
    mending.draft.insert(colon + 1, " ");
  }

  /** True for what YAML takes for the name of an anchor. */
  private static boolean name(Mending mending, int from, int end) {
    int i = from;
    while (i < end && !mending.gap(i) && ":,[]{}/.*&?%@`".indexOf(mending.draft.at(i)) < 0) {
      i++;
    }
    return i > from && i == end;
  }

  private boolean anchorInUse(int start, int end) {
    int i = start + 1;
    while (i < end && !mending.gap(i)) {
      i++;
    }
    return i > start + 1 && mending.text.content().contains("*" + mending.slice(start + 1, i));
  }
}
