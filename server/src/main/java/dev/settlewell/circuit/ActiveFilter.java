package dev.settlewell.circuit;

import java.util.Objects;

/**
 * An active low-pass in a signal path: it loads nothing before it and drives what follows through a
 * resistance.
 *
 * @param gain at DC, negative when inverting, finite
 * @param response with the gain 1 at DC
 * @param outputOhms closed-loop output resistance, 0 or more
 */
public record ActiveFilter(double gain, LowPass response, double outputOhms) implements Element {
  public ActiveFilter {
    Values.requireFinite("magnitude of the gain", Math.abs(gain));
    Objects.requireNonNull(response);
    Values.requireFinite("output resistance", outputOhms);
  }
}
