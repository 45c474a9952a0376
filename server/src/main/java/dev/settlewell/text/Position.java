package dev.settlewell.text;

/** A line and a column, both counted from 0; the column in a {@link PositionEncoding}. */
public record Position(int line, int column) {}
