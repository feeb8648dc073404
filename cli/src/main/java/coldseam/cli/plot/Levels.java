package coldseam.cli.plot;

import java.util.ArrayList;
import java.util.List;

/** Round numbers on a scale. */
final class Levels {
  private static final double[] STEPS = {1, 2, 5};
  private static final double[] FINE_STEPS = {1, 1.5, 2, 3, 5, 7};
  private static final int MOST_BANDS = 16;
  private static final int FEWEST = 5;

  private Levels() {}

  /** The largest of 1, 2, 5 times a power of ten that is not above a value. */
  static double roundDown(double value) {
    double power = Math.pow(10, Math.floor(Math.log10(value) + 1e-9));
    double found = power;
    for (double step : STEPS) {
      if (step * power <= value * (1 + 1e-9)) {
        found = step * power;
      }
    }
    return found;
  }

  /** The least of 1, 2, 5 times a power of ten that cuts a range into few enough bands. */
  static double step(double range) {
    if (!(range > 0)) {
      return 1;
    }
    double step = roundDown(range / MOST_BANDS);
    while (range / step > MOST_BANDS) {
      step = roundDown(step * 2.6);
    }
    return step;
  }

  /** Multiples of a step strictly between two values. */
  static List<Double> between(double least, double most, double step) {
    List<Double> levels = new ArrayList<>();
    double hair = 1e-6 * step;
    for (long k = (long) Math.ceil((least + hair) / step); k * step < most - hair; k++) {
      levels.add(k * step);
    }
    return levels;
  }

  /**
   * Round levels that grow by like factors strictly between two values, both more than 0: 1, 2 and
   * 5 times powers of ten, or six figures a power where those are too few.
   */
  static List<Double> series(double least, double most) {
    List<Double> coarse = series(least, most, STEPS);
    return coarse.size() >= FEWEST ? coarse : series(least, most, FINE_STEPS);
  }

  private static List<Double> series(double least, double most, double[] steps) {
    List<Double> levels = new ArrayList<>();
    for (int power = (int) Math.floor(Math.log10(least)); Math.pow(10, power) < most; power++) {
      for (double step : steps) {
        double level = step * Math.pow(10, power);
        if (level > least * (1 + 1e-9) && level < most * (1 - 1e-9)) {
          levels.add(level);
        }
      }
    }
    return levels;
  }
}
