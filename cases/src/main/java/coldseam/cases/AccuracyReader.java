package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Geometry;
import java.util.List;
import java.util.Optional;

/** Reads {@code accuracy}. */
final class AccuracyReader {
  static final List<String> KEYS = List.of("L2D", "psi", "U");

  /** Those of a body of revolution. */
  static final List<String> ROUND_KEYS = List.of("L3D", "chi");

  /** No bounds narrower than this can be told from rounding. */
  private static final double FINEST = 1e-9;

  private final Problems problems;
  private final Quantities quantities;
  private final boolean round;

  /**
   * Prepares.
   *
   * @param pass what the parts of the case share
   * @param geometry which results there can be
   */
  AccuracyReader(Pass pass, Geometry geometry) {
    round = geometry == Geometry.AXISYMMETRIC;
    this.problems = pass.problems();
    this.quantities = pass.quantities();
  }

  /**
   * Reads the half-widths asked for.
   *
   * @param node the mapping
   * @return the accuracy, the standard one where nothing or nothing right is said
   */
  Accuracy read(Node node) {
    Accuracy standard = Accuracy.STANDARD;
    Fields fields = new Fields(problems, "`accuracy`", node, round ? ROUND_KEYS : KEYS);
    double relative = standard.couplingRelative();
    double absolute = standard.couplingWPerMK();
    String coupling = round ? "L3D" : "L2D";
    if (fields.has(coupling)) {
      // What the case asks for replaces both halves of the standard.
      double[] typed = shareOrNot(fields, coupling);
      relative = typed == null ? relative : typed[0];
      absolute = typed == null ? absolute : typed[1];
    }
    if (round) {
      double[] chi = fields.has("chi") ? shareOrNot(fields, "chi") : null;
      return new Accuracy(
          relative,
          absolute,
          standard.psiWPerMK(),
          standard.transmittanceRelative(),
          chi == null ? standard.pointRelative() : Double.isInfinite(chi[0]) ? 0 : chi[0],
          chi == null ? standard.pointWPerK() : Double.isInfinite(chi[1]) ? 0 : chi[1],
          standard.mostUnknowns());
    }
    double psi = number(fields, "psi", Dimension.CONDUCTIVITY, standard.psiWPerMK());
    double u = number(fields, "U", Dimension.SHARE, standard.transmittanceRelative());
    return new Accuracy(relative, absolute, psi, u, standard.mostUnknowns());
  }

  /** A half-width as a share or in its unit, the other of the two infinite; null if wrong. */
  private double[] shareOrNot(Fields fields, String key) {
    Node node = fields.get(key).get();
    String what = "`" + key + "`";
    Value value = quantities.value(node, what + " of `accuracy`");
    boolean share = value.dimension().same(Dimension.SHARE);
    Dimension unit = round ? Dimension.CONDUCTANCE : Dimension.CONDUCTIVITY;
    double typed = checked(node, what, value, share ? Dimension.SHARE : unit);
    if (Double.isNaN(typed)) {
      return null;
    }
    return new double[] {
      share ? typed : Double.POSITIVE_INFINITY, share ? Double.POSITIVE_INFINITY : typed
    };
  }

  private double number(Fields fields, String key, Dimension dimension, double otherwise) {
    Optional<Node> node = fields.get(key);
    if (node.isEmpty()) {
      return otherwise;
    }
    String what = "`" + key + "` of `accuracy`";
    double typed = checked(node.get(), what, quantities.value(node.get(), what), dimension);
    return Double.isNaN(typed) ? otherwise : typed;
  }

  private double checked(Node node, String what, Value value, Dimension dimension) {
    if (value.unknown()) {
      return Double.NaN;
    }
    boolean share = dimension.same(Dimension.SHARE);
    String unit = round ? "in W/K" : "in W/(m K)";
    String wanted = share ? "e.g. `0.1 %`" : unit + ", e.g. `0.0002`";
    boolean fits =
        value.dimension().same(dimension) || value.dimension().kind() == Dimension.Kind.BARE;
    if (!fits) {
      problems.add(node, what + " cannot be " + value.dimension().inWords(), "it is " + wanted);
      return Double.NaN;
    }
    if (!(value.number() >= FINEST && value.number() <= (share ? 1 : 1e6))) {
      problems.add(
          node,
          what + " is out of range: " + Figures.of(value.number()),
          "it is more than 0, " + wanted);
      return Double.NaN;
    }
    return value.number();
  }
}
