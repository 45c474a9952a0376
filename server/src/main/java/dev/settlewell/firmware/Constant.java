package dev.settlewell.firmware;

import dev.settlewell.text.Place;
import java.util.OptionalDouble;

/**
 * One definition of a constant in a C or C++ source.
 *
 * @param place of its expression, in the source
 * @param value empty where the expression is not made of literals; {@code why} then says what it is
 *     made of
 * @param halfDigit how far the value may be from the figure it stands for: half the last digit that
 *     is written; 0.5 of a whole number
 */
public record Constant(
    String name, Place place, OptionalDouble value, double halfDigit, String why) {}
