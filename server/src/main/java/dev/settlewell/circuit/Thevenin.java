package dev.settlewell.circuit;

import java.util.List;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.util.FastMath;

/**
 * The Thevenin equivalent of a chain at one frequency: the voltage v/b behind the impedance a/b.
 *
 * <p>Kept as three numbers because then a resistor in series is {@code a + R b}, an admittance to
 * ground is {@code b + Y a}, and an open source (b = 0) needs no case of its own.
 */
record Thevenin(Complex v, Complex a, Complex b) {

  /** Of a source of 1 V in series with {@code sourceOhms}; infinity lets no voltage through. */
  static Thevenin source(double sourceOhms) {
    Values.requireNotNegative("source resistance", sourceOhms);
    return Double.isInfinite(sourceOhms)
        ? new Thevenin(Complex.ZERO, Complex.ONE, Complex.ZERO)
        : new Thevenin(Complex.ONE, new Complex(sourceOhms), Complex.ONE);
  }

  /** At the last node of the chain. */
  static Thevenin of(double sourceOhms, List<? extends Element> chain, double hertz) {
    Thevenin port = source(sourceOhms);
    for (Element element : chain) {
      port = port.then(element, hertz);
    }
    return port;
  }

  Complex voltage() {
    return v.equals(Complex.ZERO) ? v : v.divide(b);
  }

  Complex impedance() {
    return b.equals(Complex.ZERO) ? Complex.INF : a.divide(b);
  }

  private Thevenin then(Element element, double hertz) {
    if (element instanceof Rung.Series series) {
      return new Thevenin(v, a.add(b.multiply(series.ohms())), b);
    }
    if (element instanceof Rung.Capacitor capacitor) {
      double siemens = 2 * FastMath.PI * hertz * capacitor.farads();
      return new Thevenin(v, a, b.add(a.multiply(new Complex(0, siemens))));
    }
    if (element instanceof Rung.Parallel parallel) {
      return parallel.ohms() == 0
          ? new Thevenin(Complex.ZERO, Complex.ZERO, Complex.ONE)
          : new Thevenin(v, a, b.add(a.divide(parallel.ohms())));
    }
    if (element instanceof Amplifier amplifier) {
      Complex x = new Complex(0, hertz / amplifier.poleHertz());
      return new Thevenin(
          voltage().multiply(amplifier.gain()), x.multiply(amplifier.outputOhms()), x.add(1));
    }
    ActiveFilter filter = (ActiveFilter) element;
    Complex response = filter.response().at(hertz).multiply(filter.gain());
    return new Thevenin(
        voltage().multiply(response), new Complex(filter.outputOhms()), Complex.ONE);
  }
}
