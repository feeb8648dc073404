package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** The result card: numbers first, then what they rest on. */
final class TextCard {
  static final int PAGE = 96;

  /** What a ψ is of unless the case says so: not worth a word. */
  private static final String PLAIN = "junction";

  private final Subject subject;
  private final Result result;
  private final Ink ink;
  private final Units units;
  private final Manuscript text;

  TextCard(Subject subject, Result result, Ink ink, Manuscript text) {
    this.subject = subject;
    this.result = result;
    this.ink = ink;
    this.units = Units.of(subject);
    this.text = text;
  }

  void write() {
    title(text, subject);
    results();
    basis();
    warnings(text, result.warnings());
    foot();
  }

  /** The numbers and what they are made of. */
  void results() {
    numbers();
    accounts();
    new FramingSection(result, units, ink).write(text);
    new FloorEdgeSection(result, units, ink).write(text);
    new FlowSection(result, units, ink).write(text);
    new ShareSection(result, units, ink).write(text);
    new SurfaceSection(result, units, ink).write(text);
    new MoistureSection(result, units, ink).write(text);
    new RequiredSection(result, ink).write(text);
  }

  /** What the numbers rest on. */
  void basis() {
    flanks(text, result.flanks(), ink);
    CavitySection cavities = new CavitySection(result.cavities());
    cavities.write(text, units, ink);
    List<String> shown = names(result.flanks());
    shown.addAll(cavities.names());
    assumptions(text, result.assumptions(), shown);
  }

  static void title(Manuscript text, Subject subject) {
    String variant = subject.variant().isEmpty() ? "" : ", variant " + subject.variant().get();
    text.title(subject.title(), subject.file() + variant);
  }

  private void numbers() {
    Counted counted = Counted.of(result);
    text.heading(
        "Result",
        counted == Counted.WHOLE
            ? "films for heat loss; of the whole body of revolution"
            : "films for heat loss; after a ψ, how lengths are measured");
    Table table =
        new Table("llrrrlll", 2, PAGE)
            .named("quantity", "between", "value", "±", "± of materials", "unit", "known", "note");
    for (Result.LinearTransmittance psi : result.psi()) {
      boolean plain = psi.of().isEmpty() || psi.of().equals(psi.name()) || psi.of().equals(PLAIN);
      String of = plain ? "" : " of " + psi.of();
      number(
          table,
          "ψ " + psi.name() + of,
          Words.between(psi.warm(), psi.cold()),
          psi.valueWPerMK(),
          psi.tolerance(),
          new Scale(4, "W/(m·K)", Units.PSI, Units.PSI_NAME),
          Words.dimensions(psi));
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      number(
          table,
          "U " + u.of(),
          Words.between(u.warm(), u.cold()),
          u.valueWPerM2K(),
          u.tolerance(),
          new Scale(4, "W/(m²·K)", Units.U, Units.U_NAME),
          "over " + units.length(u.widthM()) + " " + units.unit());
      if (ofFrame(u)) {
        continue;
      }
      number(
          table,
          "R " + u.of(),
          "films included",
          u.resistanceM2KPerW(),
          Optional.empty(),
          new Scale(3, "m²·K/W", Units.R, Units.R_NAME),
          "");
    }
    for (Result.PointTransmittance chi : result.chi()) {
      number(
          table,
          "χ " + chi.name() + (chi.of().equals(chi.name()) ? "" : " of " + chi.of()),
          Words.between(chi.warm(), chi.cold()),
          chi.valueWPerK(),
          chi.tolerance(),
          new Scale(5, counted.unit(), counted.customary(), counted.customaryUnit()),
          "");
    }
    for (Result.Coupling coupling : result.couplings()) {
      number(
          table,
          counted.coupling(),
          coupling.from() + " – " + coupling.to(),
          coupling.valueWPerMK(),
          coupling.tolerance(),
          new Scale(4, counted.unit(), counted.customary(), counted.customaryUnit()),
          "");
    }
    text.table(table);
    certificate();
  }

  /**
   * How a quantity is written.
   *
   * @param decimals most decimals in SI
   * @param si its SI unit
   * @param factor to US customary units
   * @param customary their name
   */
  private record Scale(int decimals, String si, double factor, String customary) {}

  private void number(
      Table table,
      String name,
      String between,
      Quantity quantity,
      Optional<Result.Tolerance> tolerance,
      Scale scale,
      String note) {
    Digits.Figure figure = figure(quantity, 1, scale.decimals());
    table.row(
        ink.strong(name),
        between,
        ink.strong(figure.value()),
        "± " + figure.halfWidth(),
        material(tolerance, 1, scale.decimals()),
        scale.si(),
        quantity.certified() ? ink.good("certified") : ink.alert("estimate"),
        ink.faint(note));
    if (units.customary()) {
      Digits.Figure us = figure(quantity, scale.factor(), scale.decimals());
      table.row(
          "",
          "",
          us.value(),
          "± " + us.halfWidth(),
          material(tolerance, scale.factor(), scale.decimals()),
          scale.customary());
    }
  }

  /** What tolerances of conductivities add, rounded outward. */
  private static String material(
      Optional<Result.Tolerance> tolerance, double factor, int mostDecimals) {
    return tolerance.isEmpty()
        ? ""
        : "± " + Digits.outward(tolerance.get().halfWidth() * factor, 2, mostDecimals);
  }

  /** A quantity in another unit with what is known of it. */
  static Digits.Figure figure(Quantity quantity, double factor, int mostDecimals) {
    double value = quantity.value() * factor;
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      return Digits.between(value, proved.lower() * factor, proved.upper() * factor, mostDecimals);
    }
    return Digits.of(value, quantity.halfWidth() * factor, mostDecimals);
  }

  private void certificate() {
    Set<String> reasons = new LinkedHashSet<>();
    boolean proved = false;
    boolean guessed = false;
    for (Quantity quantity : Words.numbers(result)) {
      proved |= quantity.certified();
      guessed |= !quantity.certified();
      reasons.add(Words.reason(quantity));
    }
    reasons.remove("");
    if (proved) {
      sentence("Certified: the exact number of the section as resolved lies within its ±", "");
    }
    if (guessed) {
      String why = reasons.isEmpty() ? "" : " (" + String.join("; ", reasons) + ")";
      sentence(
          "Not certified"
              + (proved ? " where it says estimate" : "")
              + ": ± is an estimate of the numerical error, not a bound",
          why);
    }
    tolerances();
    missed();
  }

  /** Which numbers are not as near as was asked, and the remedy. */
  private void missed() {
    List<String> lines = new Reached(subject.accuracy()).inWords(result);
    if (lines.isEmpty()) {
      return;
    }
    text.alerts("Accuracy not reached", lines);
  }

  /** What a second ± means. */
  private void tolerances() {
    boolean proved = false;
    Set<String> reasons = new LinkedHashSet<>();
    for (Result.Tolerance tolerance : Words.tolerances(result)) {
      if (tolerance.certificate() instanceof Certificate.NotCertified not) {
        reasons.add(not.reason());
      } else {
        proved = true;
      }
    }
    String claim = "Second ±: conductivities anywhere within their stated tolerances";
    if (proved) {
      sentence(claim + "; certified for every combination of them", "");
    }
    if (!reasons.isEmpty()) {
      sentence(
          (proved ? "Elsewhere" : claim + ":") + " the worst combination to first order, estimated",
          " (" + String.join("; ", reasons) + ")");
    }
  }

  private void sentence(String claim, String why) {
    text.note(claim + why);
  }

  private void accounts() {
    if (result.frame().isPresent()) {
      frame(result.frame().get());
    }
    if (!result.chi().isEmpty()) {
      new PointSection(result).write(text, ink);
    }
    for (Result.LinearTransmittance psi : result.psi()) {
      text.heading(
          "ψ " + psi.name() + " = L2D less what is counted elsewhere",
          "W/(m·K), "
              + Words.dimensions(psi)
              + (psi.dimensions().isPresent() ? " dimensions" : " lengths"));
      int guarded = Math.max(0, Math.min(4, Digits.decimals(psi.valueWPerMK().halfWidth()) + 1));
      Table table = new Table("lrl", 2, PAGE).named("term", "W/(m·K)", "from");
      table.row(
          coupling(psi),
          Digits.fixed(psi.couplingWPerMK().value(), guarded),
          ink.faint(parts(psi)));
      for (Result.Subtracted term : psi.subtracted()) {
        table.row(
            "less " + term.name(),
            Digits.fixed(-term.valueWPerMK().mid(), guarded),
            ink.faint(derivation(term)));
      }
      Digits.Figure value = figure(psi.valueWPerMK(), 1, guarded);
      table.row("ψ", ink.strong(value.value()), ink.faint("± " + value.halfWidth()));
      text.table(table);
    }
  }

  /** The run with the panel, what is taken off, and over which width. */
  private void frame(Result.Frame frame) {
    text.heading("U frame = (L2D less what passes the panel) over the projected width", "W/(m·K)");
    int guarded = Math.max(0, Math.min(4, Digits.decimals(frame.lossWPerMK().halfWidth()) + 1));
    Table table = new Table("lrl", 2, PAGE).named("term", "W/(m·K)", "from");
    table.row(
        "L2D with the insulating panel", Digits.fixed(frame.couplingWPerMK().value(), guarded), "");
    for (Result.Subtracted term : frame.panels()) {
      table.row(
          "less " + term.name(),
          Digits.fixed(-term.valueWPerMK().mid(), guarded),
          ink.faint(derivation(term)));
    }
    Digits.Figure loss = figure(frame.lossWPerMK(), 1, guarded);
    table.row(
        "frame",
        ink.strong(loss.value()),
        ink.faint(
            "± " + loss.halfWidth() + ", over " + Digits.fixed(frame.width().valueM(), 4) + " m"));
    text.table(table);
  }

  /** U_f has an account of its own, and its inverse means nothing. */
  private boolean ofFrame(Result.EffectiveTransmittance u) {
    return result.frame().isPresent() && u.of().equals(Wanted.Frame.NAME);
  }

  /** What a ψ starts from: one L2D, or several of them added up. */
  private static String coupling(Result.LinearTransmittance psi) {
    return psi.parts().size() < 2
        ? "L2D " + Words.between(psi.warm(), psi.cold())
        : "sum of L2D, as it counts";
  }

  /** The sum in figures, {@code 0.2926 + 0.48 × 0.8239}, then which L2D they are. */
  private String parts(Result.LinearTransmittance psi) {
    if (psi.parts().size() < 2) {
      return "";
    }
    List<String> terms = new ArrayList<>();
    List<String> pairs = new ArrayList<>();
    for (Result.Coupling part : psi.parts()) {
      double counted = part.valueWPerMK().value();
      double whole = whole(part);
      String weight = counted == whole ? "1" : Digits.shortest(counted / whole, 4);
      terms.add((weight.equals("1") ? "" : weight + " × ") + Digits.fixed(whole, 4));
      pairs.add((weight.equals("1") ? "" : "b × ") + part.from() + " – " + part.to());
    }
    return String.join(" + ", terms) + ": " + String.join(" + ", pairs);
  }

  /** A coupling before its factor b; as it counts if it is 0 or stands nowhere else. */
  private double whole(Result.Coupling part) {
    for (Result.Coupling coupling : result.couplings()) {
      Set<String> pair = Set.of(coupling.from(), coupling.to());
      double value = coupling.valueWPerMK().value();
      if (pair.equals(Set.of(part.from(), part.to())) && value != 0 && Double.isFinite(value)) {
        return value;
      }
    }
    return part.valueWPerMK().value();
  }

  private static String derivation(Result.Subtracted term) {
    StringBuilder words = new StringBuilder();
    if (term.weight() != 1) {
      words.append("b ").append(Digits.shortest(term.weight(), 4)).append(" × ");
    }
    if (term.uWPerM2K().isPresent()) {
      Bracket u = term.uWPerM2K().get();
      words.append("U ").append(Digits.fixed(u.lower(), 4));
      if (u.upper() > u.lower()) {
        words.append(" to ").append(Digits.fixed(u.upper(), 4));
      }
    }
    if (term.lengthM().isPresent()) {
      words.append(" × ").append(Digits.fixed(term.lengthM().getAsDouble(), 4)).append(" m");
    }
    if (term.uWPerM2K().isEmpty() && !term.derivation().isEmpty()) {
      words.append(words.length() == 0 ? "" : ": ").append(term.derivation());
    }
    return words.toString();
  }

  static void flanks(Manuscript text, List<Result.FlankResult> flanks, Ink ink) {
    if (flanks.isEmpty()) {
      return;
    }
    text.heading("Flanks", "U in W/(m²·K), films included; layers from warm to cold");
    Table table = new Table("lrl", 2, PAGE).named("flank", "U", "spaces and layers, lengths");
    for (Result.FlankResult flank : flanks) {
      String u = Digits.fixed(flank.uWPerM2K().lower(), 4);
      if (flank.uWPerM2K().upper() > flank.uWPerM2K().lower()) {
        u += " to " + Digits.fixed(flank.uWPerM2K().upper(), 4);
      }
      table.row(
          flank.name(),
          "U " + u,
          flank.warm() + " – " + flank.cold() + ": " + String.join(" | ", flank.layers()));
      StringBuilder lengths = new StringBuilder();
      for (DimensionSystem system : DimensionSystem.values()) {
        if (flank.lengthM().containsKey(system)) {
          lengths
              .append(lengths.length() == 0 ? "" : ", ")
              .append(Words.name(system))
              .append(' ')
              .append(Digits.fixed(flank.lengthM().get(system).valueM(), 4))
              .append(" m");
        }
      }
      if (lengths.length() > 0) {
        table.row("", "", lengths.toString());
      }
    }
    text.table(table);
  }

  private static List<String> names(List<Result.FlankResult> flanks) {
    List<String> names = new ArrayList<>();
    for (Result.FlankResult flank : flanks) {
      names.add(flank.name());
    }
    return names;
  }

  /**
   * What was assumed, under its source.
   *
   * @param shown flanks and cavities that are on the sheet already: only where they come from is
   *     said of them
   */
  static void assumptions(Manuscript text, List<Assumption> assumptions, List<String> shown) {
    if (assumptions.isEmpty()) {
      return;
    }
    text.heading("Assumed", "");
    Map<String, Set<String>> bySource = new LinkedHashMap<>();
    for (Assumption assumption : assumptions) {
      Set<String> lines = bySource.get(assumption.source());
      if (lines == null) {
        lines = new LinkedHashSet<>();
        bySource.put(assumption.source(), lines);
      }
      lines.add(line(assumption, shown));
    }
    for (Map.Entry<String, Set<String>> source : bySource.entrySet()) {
      text.sourced(source.getKey(), source.getValue());
    }
  }

  private static String line(Assumption assumption, List<String> shown) {
    for (String name : shown) {
      if (assumption.what().startsWith(name + " at (")) {
        return "cavities, as above";
      }
      String end = " of flank '" + name + "'";
      if (assumption.what().endsWith(end)) {
        int stem = assumption.what().length() - end.length();
        return assumption.what().substring(0, stem) + " of flanks, as above";
      }
    }
    return assumption.what() + ": " + assumption.value();
  }

  static void warnings(Manuscript text, List<String> warnings) {
    if (warnings.isEmpty()) {
      return;
    }
    text.alertHeading("Warnings");
    text.alerts(warnings);
  }

  private void foot() {
    double seconds = 0;
    for (double ms : result.timesMs().values()) {
      seconds += ms / 1000;
    }
    text.foot(
        size(result) + ", " + Digits.significant(seconds, 2) + " s",
        Words.SAFETY,
        "Coldseam " + subject.version());
  }

  /** How fine the mesh is, and how exactly it follows the drawing. */
  static String size(Result result) {
    double movedMm = result.largestDisplacementM() * 1000;
    String moved = movedMm > 0 ? Digits.shortest(movedMm, 6) : "0";
    String films = result.surface().isPresent() ? " (films for heat loss)" : "";
    return Digits.grouped(result.triangles())
        + " triangles, "
        + Digits.grouped(result.unknowns())
        + " unknowns"
        + films
        + (moved.equals("0") ? "" : ", drawing moved by at most " + moved + " mm");
  }

  /** The films of a set, as a note. */
  static String films(FilmSet set) {
    return set == FilmSet.HEAT_LOSS ? "films for heat loss" : "films for surface temperatures";
  }
}
