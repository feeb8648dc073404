package coldseam.solver.window;

import coldseam.solver.conduction.Quantity;
import java.util.List;
import java.util.Optional;

/**
 * U_w and what it is made of.
 *
 * @param terms what is added up: panes, frames, edges, bars
 * @param installation ψ of the installation times length, by kind; none if not asked for
 * @param areaM2 area A_w of the window, m²
 * @param uWPerM2K U_w, W/(m²·K)
 * @param installedWPerM2K U_w with the installation, W/(m²·K), if asked for
 */
public record WindowTransmittance(
    List<Term> terms,
    List<Term> installation,
    double areaM2,
    Quantity uWPerM2K,
    Optional<Quantity> installedWPerM2K) {
  /** What a term stands for. */
  public enum Kind {
    /** Visible area of glass times U_g. */
    GLAZING,
    /** Visible area of opaque panels times U_p. */
    PANEL,
    /** Projected area of a profile times U_f. */
    FRAME,
    /** Visible perimeter times ψ_g. */
    EDGE,
    /** Length of glazing bars times ψ_gb. */
    BARS,
    /** Length of the joint with the wall times ψ. */
    INSTALLATION
  }

  /**
   * One term.
   *
   * @param kind what it stands for
   * @param name of the glazing, the profile, the profile and the glazing of an edge, the bars
   * @param amount area in m², or length in m
   * @param coefficient U in W/(m²·K), or ψ in W/(m·K)
   */
  public record Term(Kind kind, String name, double amount, Quantity coefficient) {
    /** Amount times coefficient, W/K. */
    public double valueWPerK() {
      return amount * coefficient.value();
    }

    /** Whether the amount is an area. */
    public boolean area() {
      return kind == Kind.GLAZING || kind == Kind.PANEL || kind == Kind.FRAME;
    }
  }

  /** Copies the lists. */
  public WindowTransmittance {
    terms = List.copyOf(terms);
    installation = List.copyOf(installation);
  }
}
