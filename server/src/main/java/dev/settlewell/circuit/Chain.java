package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A ladder reduced to its nodes with capacitance, in the error coordinate (sources grounded).
 *
 * <p>Node k has capacitance {@code farads[k]} and conductance {@code shunts[k]} to ground, and the
 * conductance {@code series[k]} leads on to node k + 1. Everything else has been eliminated
 * exactly, by sums, products and quotients of positive numbers only, so that every value keeps its
 * full relative accuracy:
 *
 * <ul>
 *   <li>resistors before the first capacitor are one Thevenin resistance;
 *   <li>a node without capacitance is a star of three resistors, replaced by its triangle;
 *   <li>0 Ω merges nodes; a node tied to its potential by 0 Ω is no state, and what lies between it
 *       and the source no longer matters to the pin.
 * </ul>
 *
 * <p>Behind an amplifier node 0 is the amplifier's output, where the inductance of its output
 * impedance is connected; it may be without capacitance.
 *
 * @param loop the amplifier that drives node 0, or null
 * @param held whether the last node is tied to its potential by 0 Ω
 */
record Chain(
    double[] farads, double[] shunts, double[] series, Drive.ClosedLoop loop, boolean held) {

  int nodes() {
    return farads.length;
  }

  /** Whether node 0 is the output of an amplifier without any capacitance there. */
  boolean bareOutput() {
    return loop != null && farads[0] == 0;
  }

  /** Number of state variables: the node voltages and the inductance's current. */
  int states() {
    return nodes() + (loop == null ? 0 : 1) - (bareOutput() ? 1 : 0);
  }

  /** The ladder alone: between acquisitions. */
  static Chain resting(Ladder ladder) {
    return new Walk(ladder.drive()).along(ladder.rungs()).end();
  }

  /** The ladder with the hold capacitor connected: its last node is the hold capacitor's. */
  static Chain acquiring(Ladder ladder, Sampler sampler) {
    return new Walk(ladder.drive())
        .along(ladder.rungs())
        .along(
            List.of(
                new Rung.Series(sampler.switchOhms()), new Rung.Capacitor(sampler.holdFarads())))
        .end();
  }

  /** Walks from the drive to the pin, collecting nodes. */
  private static final class Walk {
    private final List<Double> farads = new ArrayList<>();
    private final List<Double> shunts = new ArrayList<>();
    private final List<Double> series = new ArrayList<>();
    private Drive.ClosedLoop loop;

    /** Thevenin resistance so far; counts only while there is no node yet. */
    private double thevenin;

    /**
     * Conductance from the last node to here; infinity when here is the last node. Counts only once
     * there is a node.
     */
    private double link = Double.POSITIVE_INFINITY;

    /** Conductance from here to ground when here is not the last node. */
    private double shunt;

    Walk(Drive drive) {
      if (drive instanceof Drive.Resistive resistive) {
        thevenin = resistive.ohms();
        return;
      }
      Drive.ClosedLoop closed = (Drive.ClosedLoop) drive;
      if (closed.outputOhms() > 0 && Double.isFinite(closed.hertz())) {
        loop = closed;
        farads.add(0.0);
        shunts.add(1 / closed.outputOhms());
      }
    }

    Walk along(List<Rung> rungs) {
      for (Rung rung : rungs) {
        if (rung instanceof Rung.Series resistor) {
          series(resistor.ohms());
        } else if (rung instanceof Rung.Parallel resistor) {
          parallel(resistor.ohms());
        } else if (rung instanceof Rung.Capacitor capacitor) {
          capacitor(capacitor.farads());
        }
      }
      return this;
    }

    private void series(double ohms) {
      if (farads.isEmpty()) {
        thevenin += ohms;
      } else if (ohms > 0) {
        double onward = 1 / ohms;
        if (Double.isInfinite(link)) {
          link = onward;
          shunt = 0;
          return;
        }
        double star = link + shunt + onward;
        addShunt(link * (shunt / star));
        shunt = onward * (shunt / star);
        link = onward * (link / star);
      }
    }

    private void parallel(double ohms) {
      if (ohms == 0) {
        tie();
      } else if (farads.isEmpty()) {
        thevenin = Double.isInfinite(thevenin) ? ohms : thevenin / (1 + thevenin / ohms);
      } else if (Double.isInfinite(link)) {
        addShunt(1 / ohms);
      } else {
        shunt += 1 / ohms;
      }
    }

    /** From a point tied to its potential on, nothing before it matters. */
    private void tie() {
      farads.clear();
      shunts.clear();
      series.clear();
      loop = null;
      thevenin = 0;
      link = Double.POSITIVE_INFINITY;
    }

    private void capacitor(double value) {
      if (value == 0 || (farads.isEmpty() && thevenin == 0)) {
        return;
      }
      if (farads.isEmpty()) {
        farads.add(value);
        shunts.add(1 / thevenin);
      } else if (Double.isInfinite(link)) {
        int last = farads.size() - 1;
        farads.set(last, farads.get(last) + value);
      } else {
        farads.add(value);
        shunts.add(shunt);
        series.add(link);
      }
      link = Double.POSITIVE_INFINITY;
    }

    private void addShunt(double siemens) {
      int last = shunts.size() - 1;
      shunts.set(last, shunts.get(last) + siemens);
    }

    Chain end() {
      if (!farads.isEmpty() && Double.isFinite(link)) {
        addShunt(link * (shunt / (link + shunt)));
      }
      return new Chain(
          array(farads), array(shunts), array(series), loop, farads.isEmpty() && thevenin == 0);
    }

    private static double[] array(List<Double> values) {
      return values.stream().mapToDouble(Double::doubleValue).toArray();
    }
  }

  @Override
  public String toString() {
    return "Chain[farads=%s, shunts=%s, series=%s, loop=%s, held=%s]"
        .formatted(
            Arrays.toString(farads), Arrays.toString(shunts), Arrays.toString(series), loop, held);
  }
}
