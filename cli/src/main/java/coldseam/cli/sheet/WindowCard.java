package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.window.WindowTransmittance;
import coldseam.solver.window.WindowTransmittance.Term;
import java.util.List;

/** The card of a window on the terminal. */
record WindowCard(WindowSubject of, Ink ink) {
  private static final int MOST_DECIMALS = 4;

  void write(Manuscript text) {
    TextCard.title(text, of.subject());
    numbers(text);
    terms(text);
    parts(text);
    TextCard.assumptions(text, of.assumptions(), List.of());
    TextCard.warnings(text, of.warnings());
    text.foot(Words.SAFETY, "Coldseam " + of.subject().version());
  }

  private void numbers(Manuscript text) {
    WindowTransmittance result = of.transmittance();
    text.heading("Result", "ISO 10077-1, whole window");
    Table table =
        new Table("lrrlll", 2, TextCard.PAGE)
            .named("quantity", "value", "±", "unit", "known", "note");
    Units units = Units.of(of.subject());
    String size =
        units.length(of.window().widthM())
            + " x "
            + units.length(of.window().heightM())
            + " "
            + units.unit()
            + ", "
            + Digits.fixed(result.areaM2(), 4)
            + " m²";
    number(table, "U_w", result.uWPerM2K(), size, units);
    boolean certified = result.uWPerM2K().certified();
    if (result.installedWPerM2K().isPresent()) {
      Quantity installed = result.installedWPerM2K().get();
      number(table, "U_w installed", installed, "", units);
      certified &= installed.certified();
    }
    text.table(table);
    String claim =
        certified
            ? "Certified: the sum lies within its ±, typed figures taken as they stand"
            : "Not certified where it says estimate: ± is the sum of estimated errors, not a bound";
    text.note(claim);
    String reason = Words.reason(result.uWPerM2K());
    if (!reason.isEmpty()) {
      text.note("(" + reason + ")");
    }
  }

  private void number(Table table, String name, Quantity quantity, String note, Units units) {
    Digits.Figure figure = figure(quantity, 1);
    table.row(
        ink.strong(name),
        ink.strong(figure.value()),
        "± " + figure.halfWidth(),
        "W/(m²·K)",
        quantity.certified() ? ink.good("certified") : ink.alert("estimate"),
        ink.faint(note));
    if (units.customary()) {
      Digits.Figure us = figure(quantity, Units.U);
      table.row("", us.value(), "± " + us.halfWidth(), Units.U_NAME);
    }
  }

  private static Digits.Figure figure(Quantity quantity, double factor) {
    double value = quantity.value() * factor;
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      return Digits.between(value, proved.lower() * factor, proved.upper() * factor, MOST_DECIMALS);
    }
    return Digits.of(value, quantity.halfWidth() * factor, MOST_DECIMALS);
  }

  private void terms(Manuscript text) {
    text.heading("What it is made of", "area times U, length times ψ; share of the sum");
    Table table =
        new Table("llrlrlrr", 2, TextCard.PAGE)
            .named("term", "name", "amount", "unit", "coefficient", "unit", "W/K", "share");
    WindowTransmittance result = of.transmittance();
    double sum = 0;
    for (Term term : result.terms()) {
      sum += term.valueWPerK();
    }
    for (Term term : result.terms()) {
      row(table, term, sum);
    }
    table.row(
        "", "", "", "", "", "", ink.strong(Digits.fixed(sum, MOST_DECIMALS)), ink.faint("W/K"));
    for (Term term : result.installation()) {
      row(table, term, sum);
    }
    text.table(table);
  }

  private void row(Table table, Term term, double sum) {
    Digits.Figure coefficient = figure(term.coefficient(), 1);
    boolean exact = term.coefficient().halfWidth() == 0;
    table.row(
        WindowWords.name(term.kind()),
        term.name(),
        Digits.fixed(term.amount(), MOST_DECIMALS),
        term.area() ? "m²" : "m",
        exact ? Digits.shortest(term.coefficient().value(), 6) : coefficient.text(),
        term.area() ? "W/(m²·K)" : "W/(m·K)",
        Digits.fixed(term.valueWPerK(), MOST_DECIMALS),
        ink.faint(Digits.fixed(100 * term.valueWPerK() / sum, 1) + " %"));
  }

  private void parts(Manuscript text) {
    if (of.parts().isEmpty()) {
      return;
    }
    text.heading("Cases solved for it", "");
    Table table = new Table("lrl", 2, TextCard.PAGE).named("case", "size", "note");
    for (WindowSubject.Part part : of.parts()) {
      table.row(
          part.name(),
          Digits.grouped(part.unknowns()) + " unknowns",
          part.reached() ? "" : ink.alert("accuracy not reached"));
    }
    text.table(table);
  }
}
