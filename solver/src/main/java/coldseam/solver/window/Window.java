package coldseam.solver.window;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.window.WindowTransmittance.Kind;
import coldseam.solver.window.WindowTransmittance.Term;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * U_w = (Σ A_g U_g + Σ A_p U_p + Σ A_f U_f + Σ l_g ψ_g + Σ l_gb ψ_gb) / A_w, and installed + Σ l ψ
 * / A_w (ISO 10077-1; <em>from memory</em>).
 *
 * <p>A_f goes by the larger projected width of each profile and A_g is what is left, so that they
 * add up to A_w; l_g of a pane is the larger of its perimeters seen from the two sides. Corners are
 * mitred: each of two profiles that meet takes half of the corner. Mullions run from head to sill,
 * transoms between them.
 *
 * @param widthM overall width, m
 * @param heightM overall height, m
 * @param frame the profile of each side
 * @param mullions from left to right
 * @param transoms from top to bottom
 * @param panes what fills each pane: rows from top to bottom, each from left to right
 * @param bars glazing bars
 * @param installationWPerMK ψ of the joint with the wall on each side, W/(m·K), if asked for
 */
public record Window(
    double widthM,
    double heightM,
    Sides<Profile> frame,
    List<Divider> mullions,
    List<Divider> transoms,
    List<List<Infill>> panes,
    List<Bars> bars,
    Optional<Sides<Quantity>> installationWPerMK) {
  private static final int VISIBLE = 0;
  private static final int INSIDE = 1;
  private static final int OUTSIDE = 2;

  /** Copies the lists. */
  public Window {
    mullions = List.copyOf(mullions);
    transoms = List.copyOf(transoms);
    List<List<Infill>> rows = new ArrayList<>();
    for (List<Infill> row : panes) {
      rows.add(List.copyOf(row));
    }
    panes = List.copyOf(rows);
    bars = List.copyOf(bars);
  }

  /** Amounts with one coefficient each, in the order they first come up. */
  private static final class Tally {
    private final Kind kind;
    private final Map<String, Term> terms = new LinkedHashMap<>();

    Tally(Kind kind) {
      this.kind = kind;
    }

    void add(String name, double amount, Quantity coefficient) {
      Term before = terms.get(name);
      double sum = before == null ? amount : before.amount() + amount;
      terms.put(name, new Term(kind, name, sum, coefficient));
    }
  }

  /** Gaps between the profiles in one direction: where each pane begins and ends, m. */
  private record Gaps(double[] from, double[] to) {
    static Gaps of(double whole, Profile first, Profile last, List<Divider> between, int side) {
      int n = between.size() + 1;
      double[] from = new double[n];
      double[] to = new double[n];
      from[0] = seen(first, side);
      to[n - 1] = whole - seen(last, side);
      for (int i = 0; i < n - 1; i++) {
        Divider divider = between.get(i);
        double half = seen(divider.profile(), side) / 2;
        to[i] = divider.centreM() - half;
        from[i + 1] = divider.centreM() + half;
      }
      return new Gaps(from, to);
    }

    private static double seen(Profile profile, int side) {
      return switch (side) {
        case INSIDE -> profile.insideWidthM();
        case OUTSIDE -> profile.outsideWidthM();
        default -> profile.widthM();
      };
    }

    double size(int i) {
      return to[i] - from[i];
    }
  }

  /**
   * Works U_w out.
   *
   * @return U_w, every term, and U_w installed if that is asked for
   * @throws IllegalArgumentException if the profiles leave no glass in a pane, the panes are not as
   *     many as mullions and transoms make, or a ψ is missing
   */
  public WindowTransmittance transmittance() {
    requirePanes();
    Gaps columns = columns(VISIBLE);
    Gaps rows = rows(VISIBLE);
    requireGlass(columns, rows);
    List<Term> terms = new ArrayList<>();
    terms.addAll(infills(columns, rows));
    terms.addAll(frames());
    terms.addAll(edges());
    for (Bars kind : bars) {
      double length =
          kind.lengthM().isPresent() ? kind.lengthM().getAsDouble() : length(kind, columns, rows);
      terms.add(new Term(Kind.BARS, kind.name(), length, kind.psiWPerMK()));
    }
    List<Term> installation = installation();
    double area = widthM * heightM;
    List<Term> all = new ArrayList<>(terms);
    all.addAll(installation);
    return new WindowTransmittance(
        terms,
        installation,
        area,
        per(area, terms),
        installationWPerMK.isEmpty() ? Optional.empty() : Optional.of(per(area, all)));
  }

  private Gaps columns(int side) {
    return Gaps.of(widthM, frame.left(), frame.right(), mullions, side);
  }

  private Gaps rows(int side) {
    return Gaps.of(heightM, frame.top(), frame.bottom(), transoms, side);
  }

  private void requirePanes() {
    if (!(widthM > 0 && heightM > 0) || !Double.isFinite(widthM * heightM)) {
      throw new IllegalArgumentException("a window has a width and a height");
    }
    boolean right = panes.size() == transoms.size() + 1;
    for (List<Infill> row : panes) {
      right &= row.size() == mullions.size() + 1;
    }
    if (!right) {
      throw new IllegalArgumentException(
          "mullions and transoms make "
              + (transoms.size() + 1)
              + " x "
              + (mullions.size() + 1)
              + " panes (rows x columns), and those given are others");
    }
  }

  private void requireGlass(Gaps columns, Gaps rows) {
    for (int i = 0; i <= mullions.size(); i++) {
      if (!(columns.size(i) > 0)) {
        throw new IllegalArgumentException("the profiles leave no glass in column " + (i + 1));
      }
    }
    for (int i = 0; i <= transoms.size(); i++) {
      if (!(rows.size(i) > 0)) {
        throw new IllegalArgumentException("the profiles leave no glass in row " + (i + 1));
      }
    }
  }

  private List<Term> infills(Gaps columns, Gaps rows) {
    Tally glass = new Tally(Kind.GLAZING);
    Tally panels = new Tally(Kind.PANEL);
    for (int row = 0; row < panes.size(); row++) {
      for (int column = 0; column <= mullions.size(); column++) {
        Infill infill = panes.get(row).get(column);
        (infill.opaque() ? panels : glass)
            .add(infill.name(), columns.size(column) * rows.size(row), infill.uWPerM2K());
      }
    }
    List<Term> terms = new ArrayList<>(glass.terms.values());
    terms.addAll(panels.terms.values());
    return terms;
  }

  private List<Term> frames() {
    double top = frame.top().widthM();
    double bottom = frame.bottom().widthM();
    double left = frame.left().widthM();
    double right = frame.right().widthM();
    Tally areas = new Tally(Kind.FRAME);
    area(areas, frame.top(), top * (widthM - (left + right) / 2));
    area(areas, frame.bottom(), bottom * (widthM - (left + right) / 2));
    area(areas, frame.left(), left * (heightM - (top + bottom) / 2));
    area(areas, frame.right(), right * (heightM - (top + bottom) / 2));
    double between = widthM - left - right;
    for (Divider mullion : mullions) {
      area(areas, mullion.profile(), mullion.profile().widthM() * (heightM - top - bottom));
      between -= mullion.profile().widthM();
    }
    for (Divider transom : transoms) {
      area(areas, transom.profile(), transom.profile().widthM() * between);
    }
    return List.copyOf(areas.terms.values());
  }

  private static void area(Tally areas, Profile profile, double area) {
    areas.add(profile.name(), area, profile.uWPerM2K());
  }

  /** The visible perimeter of every pane, on the side where it is larger, edge by edge. */
  private List<Term> edges() {
    Gaps[] columns = {columns(INSIDE), columns(OUTSIDE)};
    Gaps[] rows = {rows(INSIDE), rows(OUTSIDE)};
    Tally edges = new Tally(Kind.EDGE);
    for (int row = 0; row < panes.size(); row++) {
      for (int column = 0; column <= mullions.size(); column++) {
        Infill infill = panes.get(row).get(column);
        double inside = columns[0].size(column) + rows[0].size(row);
        double outside = columns[1].size(column) + rows[1].size(row);
        int side = inside >= outside ? 0 : 1;
        double width = columns[side].size(column);
        double height = rows[side].size(row);
        edge(edges, row == 0 ? frame.top() : transoms.get(row - 1).profile(), infill, width);
        edge(
            edges,
            row == transoms.size() ? frame.bottom() : transoms.get(row).profile(),
            infill,
            width);
        edge(
            edges, column == 0 ? frame.left() : mullions.get(column - 1).profile(), infill, height);
        edge(
            edges,
            column == mullions.size() ? frame.right() : mullions.get(column).profile(),
            infill,
            height);
      }
    }
    return List.copyOf(edges.terms.values());
  }

  private static void edge(Tally edges, Profile profile, Infill infill, double length) {
    edges.add(profile.name() + " with " + infill.name(), length, profile.edge(infill));
  }

  private double length(Bars kind, Gaps columns, Gaps rows) {
    double length = 0;
    for (int row = 0; row < panes.size(); row++) {
      for (int column = 0; column <= mullions.size(); column++) {
        if (!panes.get(row).get(column).opaque()) {
          length += kind.upright() * rows.size(row) + kind.level() * columns.size(column);
        }
      }
    }
    return length;
  }

  private List<Term> installation() {
    if (installationWPerMK.isEmpty()) {
      return List.of();
    }
    Sides<Quantity> psi = installationWPerMK.get();
    return List.of(
        new Term(Kind.INSTALLATION, "top", widthM, psi.top()),
        new Term(Kind.INSTALLATION, "bottom", widthM, psi.bottom()),
        new Term(Kind.INSTALLATION, "left", heightM, psi.left()),
        new Term(Kind.INSTALLATION, "right", heightM, psi.right()));
  }

  /** The sum of terms over an area: proved where every term is, ends added to ends. */
  private static Quantity per(double area, List<Term> terms) {
    double value = 0;
    double lower = 0;
    double upper = 0;
    double estimate = 0;
    String reason = "";
    for (Term term : terms) {
      Quantity one = term.coefficient();
      double part = term.amount() / area;
      value += part * one.value();
      estimate += part * one.halfWidth();
      if (one.certificate() instanceof Certificate.Certified proved) {
        lower += part * proved.lower();
        upper += part * proved.upper();
      } else if (reason.isEmpty()) {
        reason = ((Certificate.NotCertified) one.certificate()).reason();
      }
    }
    return reason.isEmpty()
        ? new Quantity(lower + (upper - lower) / 2, new Certificate.Certified(lower, upper))
        : new Quantity(value, new Certificate.NotCertified(reason, estimate));
  }
}
