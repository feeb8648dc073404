package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.GainUse;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Uncertain;
import java.util.ArrayList;
import java.util.List;

/** The card of a ledger on the terminal: schedule, H_T, account, what closes it. */
record LedgerCard(LedgerSubject of, Ink ink) {
  private static final int COEFFICIENT_DECIMALS = 4;

  void write(Manuscript text) {
    TextCard.title(text, of.subject());
    result(text);
    schedule(text);
    transmission(text);
    account(text);
    gains(text);
    parts(text);
    TextCard.assumptions(text, of.assumptions(), List.of());
    TextCard.warnings(text, of.account().warnings());
    text.foot(Words.SAFETY, "Coldseam " + of.subject().version());
  }

  private Ledger ledger() {
    return of.account().ledger();
  }

  private void result(Manuscript text) {
    text.heading("Result", period());
    Table table =
        new Table("lrlll", 2, TextCard.PAGE).named("quantity", "value", "±", "unit", "note");
    if (ledger().outcome() instanceof Ledger.Designed outcome) {
      energy(table, "heat needed", outcome.needKWh(), "");
      String bought = LedgerWords.bought(outcome);
      if (!bought.isEmpty()) {
        energy(table, "to buy", outcome.boughtKWh(), bought);
      }
      text.table(table);
    } else if (ledger().outcome() instanceof Ledger.Metered outcome) {
      energy(table, "came in", outcome.cameInKWh(), "");
      energy(table, "went out, as far as known", outcome.wentOutKWh().times(-1), "");
      energy(table, "not explained by the data", outcome.remainderKWh(), "");
      text.table(table);
      text.note(LedgerWords.remainder(outcome));
    }
    meaning(text);
  }

  private void energy(Table table, String name, Uncertain energy, String note) {
    String plusMinus =
        (LedgerWords.energyHalfWidth(energy) + " " + LedgerWords.energyTolerance(energy)).strip();
    table.row(
        ink.strong(name),
        ink.strong(LedgerWords.amount(energy)),
        plusMinus,
        "kWh",
        ink.faint(note));
  }

  /** What the ± stand for, where there are some. */
  private void meaning(Manuscript text) {
    Uncertain closing = closing();
    boolean wide = !LedgerWords.energyHalfWidth(closing).isEmpty();
    boolean tolerant = !LedgerWords.energyTolerance(closing).isEmpty();
    if (!wide && !tolerant) {
      return;
    }
    String says = "";
    if (wide) {
      says =
          closing.proved()
              ? "±: intervals of U, ψ and χ, all at their worst together. "
              : "±: intervals of U, ψ and χ, some of them estimates. ";
    }
    if (tolerant) {
      says += "(±): conductivities anywhere within their tolerances, all at their worst together. ";
    }
    text.note(says.strip());
  }

  private Uncertain closing() {
    return ledger().outcome() instanceof Ledger.Designed designed
        ? designed.needKWh()
        : ((Ledger.Metered) ledger().outcome()).remainderKWh();
  }

  private String period() {
    Climate climate = ledger().climate();
    String days = Digits.shortest(climate.days(), 2) + " days, inside ";
    String drive =
        climate.baseC().isPresent()
            ? Digits.shortest(climate.meanDifferenceK() * climate.days(), 1)
                + " K·d to a base of "
                + Digits.shortest(climate.baseC().getAsDouble(), 2)
                + " °C"
            : "outside "
                + Digits.fixed(climate.insideC() - climate.meanDifferenceK(), 1)
                + " °C on average";
    return days + Digits.shortest(climate.insideC(), 2) + " °C, " + drive;
  }

  private void schedule(Manuscript text) {
    String measured =
        of.account()
            .dimensions()
            .map(system -> "by " + Words.name(system) + " dimensions")
            .orElse("");
    text.heading("Junctions", measured);
    rows(text, true);
    text.heading("Plane elements and air", "area times U; share of H_T");
    rows(text, false);
  }

  private void rows(Manuscript text, boolean bridges) {
    Table table =
        new Table("lrlrlrrl", 2, TextCard.PAGE)
            .named("part", "amount", "unit", "coefficient", "unit", "H", "share of H_T", "source");
    double transmission = ledger().envelope().transmissionWPerK().value();
    for (Envelope.Part part : ledger().envelope().parts()) {
      if (part.bridge() == bridges) {
        row(table, part, transmission);
      }
    }
    if (table.isEmpty()) {
      text.note("none");
    }
    text.table(table);
  }

  private void row(Table table, Envelope.Part part, double transmission) {
    Uncertain h = part.conductanceWPerK();
    String share = part.air() ? "" : Digits.fixed(100 * h.value() / transmission, 1) + " %";
    String note = part.source();
    if (!part.room().isEmpty()) {
      String b = "to " + part.room() + ", b " + Digits.shortest(part.b().value(), 3);
      note = note.isEmpty() ? b : b + "; " + note;
    }
    table.row(
        part.name(),
        Digits.shortest(part.amount(), 2),
        amountUnit(part),
        coefficient(part.coefficient()),
        coefficientUnit(part),
        LedgerWords.conductance(h) + " W/K",
        ink.faint(share),
        ink.faint(note));
  }

  private static String coefficient(Uncertain number) {
    String text = LedgerWords.halfWidth(number, COEFFICIENT_DECIMALS);
    return text.isEmpty()
        ? Digits.shortest(number.value(), COEFFICIENT_DECIMALS)
        : Digits.between(number.value(), number.lower(), number.upper(), COEFFICIENT_DECIMALS)
            .text();
  }

  private static String amountUnit(Envelope.Part part) {
    return switch (part.kind()) {
      case JUNCTION -> "m";
      case POINT -> "";
      case AIR, LEAKAGE -> "m³/h";
      default -> "m²";
    };
  }

  private static String coefficientUnit(Envelope.Part part) {
    return switch (part.kind()) {
      case JUNCTION -> "W/(m·K)";
      case POINT -> "W/K";
      case AIR, LEAKAGE -> "W·h/(m³·K)";
      default -> "W/(m²·K)";
    };
  }

  private void transmission(Manuscript text) {
    Envelope envelope = ledger().envelope();
    text.heading("Heat transfer", "");
    Table table =
        new Table("lrlll", 2, TextCard.PAGE).named("quantity", "value", "±", "unit", "note");
    conductance(table, "H_T, transmission", envelope.transmissionWPerK(), "");
    Uncertain share = envelope.bridgeShare();
    conductance(
        table,
        "junctions and points in it",
        envelope.bridgesWPerK(),
        Digits.between(100 * share.value(), 100 * share.lower(), 100 * share.upper(), 2).value()
            + " % of H_T");
    conductance(table, "H_V, air", envelope.airWPerK(), "");
    Uncertain mean = envelope.meanDeltaUWPerM2K();
    table.row(
        "mean ΔU of junctions and points",
        Digits.between(mean.value(), mean.lower(), mean.upper(), 5).value(),
        LedgerWords.halfWidth(mean, 5),
        "W/(m²·K)",
        ink.faint("over " + Digits.shortest(envelope.areaM2(), 2) + " m² of envelope"));
    text.table(table);
  }

  private void conductance(Table table, String name, Uncertain number, String note) {
    String plusMinus =
        (LedgerWords.conductanceHalfWidth(number) + " " + LedgerWords.conductanceTolerance(number))
            .strip();
    table.row(name, ink.strong(LedgerWords.conductance(number)), plusMinus, "W/K", ink.faint(note));
  }

  private void account(Manuscript text) {
    text.heading("Account", "kWh; in positive, out negative");
    Table table =
        new Table("lrrlr", 2, TextCard.PAGE)
            .named("item", "kWh", "in all, kWh", "±", "of what came in");
    double in = 0;
    for (Entry entry : ledger().entries()) {
      in += entry.in() ? entry.energyKWh().value() : 0;
    }
    for (LedgerWords.Group group : LedgerWords.Group.values()) {
      List<Entry> items = new ArrayList<>();
      Uncertain sum = Uncertain.ZERO;
      for (Entry entry : ledger().entries()) {
        if (LedgerWords.group(entry) == group) {
          items.add(entry);
          sum = sum.plus(entry.energyKWh());
        }
      }
      group(table, group, items, sum, in);
    }
    table.row(ink.strong("sum"), "", ink.strong(Digits.fixed(ledger().sumKWh(), 1)), "", "");
    text.table(table);
  }

  /** One line for a single item; else a line for all of them, and one for each below it. */
  private void group(
      Table table, LedgerWords.Group group, List<Entry> items, Uncertain sum, double in) {
    if (items.isEmpty()) {
      return;
    }
    String share = in > 0 ? Digits.fixed(100 * Math.abs(sum.value()) / in, 1) + " %" : "";
    table.row(
        items.size() == 1 ? name(items.get(0)) : group.words(),
        "",
        LedgerWords.energy(sum),
        ink.faint(plusMinus(sum)),
        ink.faint(share));
    for (int i = 0; i < items.size() && items.size() > 1; i++) {
      Uncertain energy = items.get(i).energyKWh();
      table.row(
          "  " + name(items.get(i)),
          LedgerWords.energy(energy),
          "",
          ink.faint(plusMinus(energy)),
          "");
    }
  }

  private static String plusMinus(Uncertain energy) {
    return (LedgerWords.energyHalfWidth(energy) + " " + LedgerWords.energyTolerance(energy))
        .strip();
  }

  private static String name(Entry entry) {
    return switch (entry.kind()) {
      case ROOM -> "by way of " + entry.name();
      case GROUND -> entry.name() + ", to the ground";
      default -> entry.name();
    };
  }

  private void gains(Manuscript text) {
    if (!(ledger().outcome() instanceof Ledger.Designed outcome) || outcome.steps().isEmpty()) {
      return;
    }
    text.heading("Use of gains", "γ gains over losses, τ = C/H, η used");
    Table table = new Table("lrrrrrrr", 2, TextCard.PAGE);
    table.head("", "losses", "gains", "γ", "H W/K", "τ h", "η", "used");
    for (GainUse.Step step : outcome.steps()) {
      table.row(
          step.name(),
          Digits.fixed(step.lossKWh(), 1),
          Digits.fixed(step.gainKWh(), 1),
          Digits.fixed(step.use().ratio(), 3),
          Digits.fixed(step.conductanceWPerK(), 2),
          Digits.fixed(step.use().timeConstantH(), 1),
          Digits.fixed(step.use().factor(), 4),
          Digits.fixed(step.usedKWh(), 1));
    }
    text.table(table);
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
