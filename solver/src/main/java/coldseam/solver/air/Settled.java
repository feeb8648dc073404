package coldseam.solver.air;

import java.util.Arrays;

/**
 * The state of every cavity of a detail: the direction of heat flow, the temperatures met and the
 * conductivity that follows.
 *
 * @param axis the axis nearest to the heat flow
 * @param forward whether heat flows along it and not against it
 * @param conductivityWPerMK λ_eq, W/(m·K)
 * @param differenceK largest difference of surface temperatures, K; NaN where it is not needed
 * @param meanC mean surface temperature, °C; NaN where it is not needed
 * @param before conductivities of the step before; null if there was none
 * @param answered what they led to; null if there was none
 * @param turns how often the direction changed after it was first chosen
 * @param passes solutions looked at so far
 * @param change largest relative change of a conductivity that was still found
 * @param settled whether that is small enough
 */
record Settled(
    int[] axis,
    boolean[] forward,
    double[] conductivityWPerMK,
    double[] differenceK,
    double[] meanC,
    double[] before,
    double[] answered,
    int[] turns,
    int passes,
    double change,
    boolean settled) {
  static Settled begin(int count) {
    double[] unknown = new double[count];
    Arrays.fill(unknown, Double.NaN);
    int[] none = new int[count];
    Arrays.fill(none, -1);
    return new Settled(
        none,
        new boolean[count],
        new double[count],
        unknown,
        unknown.clone(),
        null,
        null,
        new int[count],
        0,
        Double.POSITIVE_INFINITY,
        false);
  }

  Settled keeping(double[] conductivities) {
    return new Settled(
        axis,
        forward,
        conductivities,
        differenceK,
        meanC,
        before,
        answered,
        turns,
        passes,
        change,
        settled);
  }

  Settled restarted() {
    return new Settled(
        axis,
        forward,
        conductivityWPerMK,
        differenceK,
        meanC,
        null,
        null,
        new int[turns.length],
        0,
        change,
        false);
  }
}
