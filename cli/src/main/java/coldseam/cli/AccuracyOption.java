package coldseam.cli;

import coldseam.cases.study.Measure;
import coldseam.solver.detail.Accuracy;
import java.math.BigDecimal;
import java.util.List;

/** Reads the value of {@code --accuracy}: {@code L2D=0.02%,psi=0.0002,U=0.1%}, one or more. */
final class AccuracyOption {
  private static final List<String> NAMES = List.of("L2D", "psi", "U", "L3D", "chi");

  private AccuracyOption() {}

  /**
   * Changes an accuracy.
   *
   * @param base what holds where nothing is typed
   * @param typed the value of the option
   * @return the accuracy asked for
   * @throws UsageException if it cannot be read
   */
  static Accuracy read(Accuracy base, String typed) throws UsageException {
    Accuracy accuracy = base;
    for (String part : typed.split(",", -1)) {
      int equals = part.indexOf('=');
      String name = equals < 0 ? part.strip() : part.substring(0, equals).strip();
      if (!NAMES.contains(name)) {
        throw wrong(
            Nearest.of(name, NAMES)
                .map(near -> "\"" + name + "\" has no accuracy; did you mean " + near + "=…?")
                .orElse("\"" + part + "\" is no accuracy; e.g. --accuracy L2D=0.02%,psi=0.0002"));
      }
      if (equals < 0) {
        throw wrong(name + " needs a half-width, e.g. --accuracy " + name + "=0.1%");
      }
      accuracy = with(accuracy, name, part.substring(equals + 1).strip());
    }
    return accuracy;
  }

  /**
   * Limits the size of the solve.
   *
   * @param base what holds otherwise
   * @param typed the value of {@code --most-unknowns}
   * @return the accuracy asked for
   * @throws UsageException if it cannot be read
   */
  static Accuracy limit(Accuracy base, String typed) throws UsageException {
    int most = 0;
    try {
      most = Integer.parseInt(typed);
    } catch (NumberFormatException e) {
      throw wrong("\"" + typed + "\" is no whole number; e.g. --most-unknowns 100000");
    }
    if (most <= 0) {
      throw wrong("--most-unknowns is more than 0, not " + typed);
    }
    return new Accuracy(
        base.couplingRelative(),
        base.couplingWPerMK(),
        base.psiWPerMK(),
        base.transmittanceRelative(),
        base.pointRelative(),
        base.pointWPerK(),
        most);
  }

  /**
   * The half-width of one number as {@link #read} takes it.
   *
   * @param kind which number; one that can be proved
   * @param accuracy the accuracy
   * @return the value of the option
   */
  static String written(Measure.Kind kind, Accuracy accuracy) {
    return switch (kind) {
      case PSI -> "psi=" + plain(accuracy.psiWPerMK());
      case U ->
          "U="
              + plain(BigDecimal.valueOf(accuracy.transmittanceRelative()).movePointRight(2))
              + "%";
      case CHI -> "chi=" + plain(accuracy.pointWPerK());
      case L3D ->
          "L3D=" + plain(BigDecimal.valueOf(accuracy.couplingRelative()).movePointRight(2)) + "%";
      case L2D ->
          accuracy.couplingRelative() < 1
              ? "L2D="
                  + plain(BigDecimal.valueOf(accuracy.couplingRelative()).movePointRight(2))
                  + "%"
              : "L2D=" + plain(accuracy.couplingWPerMK());
      default -> throw new IllegalArgumentException("surface temperatures have no half-width");
    };
  }

  private static String plain(double number) {
    return plain(BigDecimal.valueOf(number));
  }

  private static String plain(BigDecimal number) {
    return number.stripTrailingZeros().toPlainString();
  }

  private static Accuracy with(Accuracy a, String name, String typed) throws UsageException {
    boolean share = typed.endsWith("%");
    double number = number(name, share ? typed.substring(0, typed.length() - 1).strip() : typed);
    double value = share ? number / 100 : number;
    switch (name) {
      case "L2D", "L3D" -> {
        return new Accuracy(
            share ? value : Double.MAX_VALUE,
            share ? Double.MAX_VALUE : value,
            a.psiWPerMK(),
            a.transmittanceRelative(),
            a.pointRelative(),
            a.pointWPerK(),
            a.mostUnknowns());
      }
      case "chi" -> {
        return new Accuracy(
            a.couplingRelative(),
            a.couplingWPerMK(),
            a.psiWPerMK(),
            a.transmittanceRelative(),
            share ? value : 0,
            share ? 0 : value,
            a.mostUnknowns());
      }
      case "psi" -> {
        if (share) {
          throw wrong("the accuracy of ψ is in W/(m·K), not a share of it, e.g. psi=0.0002");
        }
        return new Accuracy(
            a.couplingRelative(),
            a.couplingWPerMK(),
            value,
            a.transmittanceRelative(),
            a.pointRelative(),
            a.pointWPerK(),
            a.mostUnknowns());
      }
      default -> {
        if (!share) {
          throw wrong("the accuracy of U is a share of it, e.g. U=0.1%");
        }
        return new Accuracy(
            a.couplingRelative(),
            a.couplingWPerMK(),
            a.psiWPerMK(),
            value,
            a.pointRelative(),
            a.pointWPerK(),
            a.mostUnknowns());
      }
    }
  }

  private static double number(String name, String typed) throws UsageException {
    try {
      double value = Double.parseDouble(typed);
      if (value > 0 && Double.isFinite(value)) {
        return value;
      }
    } catch (NumberFormatException e) {
      throw wrong("\"" + typed + "\" is no number; e.g. --accuracy " + name + "=0.1%");
    }
    throw wrong("the accuracy of " + name + " is more than 0, not " + typed);
  }

  private static UsageException wrong(String message) {
    return new UsageException("solve", message);
  }
}
