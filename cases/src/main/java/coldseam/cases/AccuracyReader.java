package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import java.util.List;
import java.util.Optional;

/** Reads {@code accuracy}. */
final class AccuracyReader {
  static final List<String> KEYS = List.of("L2D", "psi", "U");

  /** No bounds narrower than this can be told from rounding. */
  private static final double FINEST = 1e-9;

  private final Problems problems;
  private final Quantities quantities;

  AccuracyReader(Pass pass) {
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
    Fields fields = new Fields(problems, "`accuracy`", node, KEYS);
    double relative = standard.couplingRelative();
    double absolute = standard.couplingWPerMK();
    if (fields.has("L2D")) {
      // What the case asks for replaces both halves of the standard.
      Node l2d = fields.get("L2D").get();
      Value value = quantities.value(l2d, "`L2D` of `accuracy`");
      boolean share = value.dimension().same(Dimension.SHARE);
      double typed = checked(l2d, "`L2D`", value, share ? Dimension.SHARE : Dimension.CONDUCTIVITY);
      if (!Double.isNaN(typed)) {
        relative = share ? typed : Double.POSITIVE_INFINITY;
        absolute = share ? Double.POSITIVE_INFINITY : typed;
      }
    }
    double psi = number(fields, "psi", Dimension.CONDUCTIVITY, standard.psiWPerMK());
    double u = number(fields, "U", Dimension.SHARE, standard.transmittanceRelative());
    return new Accuracy(relative, absolute, psi, u, standard.mostUnknowns());
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
    String wanted = share ? "e.g. `0.1 %`" : "in W/(m K), e.g. `0.0002`";
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
