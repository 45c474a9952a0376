package dev.settlewell.text;

/**
 * A half-open stretch of a text, in UTF-16 offsets: {@code start} is inside, {@code end} is not.
 *
 * <p>Offsets are the one coordinate below the faces of the tool; lines and columns exist only where
 * a person or a client reads them (see {@link SourceText}).
 */
public record Span(int start, int end) {
  public Span {
    if (start < 0 || end < start) {
      throw new IllegalArgumentException("no such stretch: " + start + " to " + end);
    }
  }

  public static Span at(int offset) {
    return new Span(offset, offset);
  }

  public int length() {
    return end - start;
  }

  /** True for offsets inside and for the one just behind the last: where a cursor may stand. */
  public boolean touches(int offset) {
    return start <= offset && offset <= end;
  }

  public boolean contains(Span other) {
    return start <= other.start && other.end <= end;
  }

  public boolean overlaps(Span other) {
    return start < other.end && other.start < end;
  }

  /** The stretch {@code from} to {@code to}, counted from this one's start. */
  public Span sub(int from, int to) {
    return new Span(start + from, start + to);
  }

  public Span shifted(int by) {
    return new Span(start + by, end + by);
  }
}
