package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Uncertain;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The figure of a ledger: heat that crosses the boundary drawn around a building, widths to scale.
 * Immutable.
 */
public final class LedgerPlot {
  private static final String NAME = "ledger";
  private static final double WIDTH = 904;

  /** A little flatter than what leaves room for a key beside it. */
  private static final double HEIGHT = 424;

  /** Junctions of the key; the rest is summed up. */
  private static final int MOST_JUNCTIONS = 10;

  private final String title;
  private final Ledger ledger;
  private final Flows flows;

  /**
   * Prepares.
   *
   * @param title of the building
   * @param ledger its account
   */
  public LedgerPlot(String title, Ledger ledger) {
    this.title = title;
    this.ledger = ledger;
    flows = Flows.of(ledger);
  }

  /**
   * Draws it as SVG. Needs no font on the machine.
   *
   * @return an XML document
   */
  public String svg() {
    Page page = page();
    SvgCanvas canvas = SvgCanvas.blank(NAME);
    draw(canvas, page);
    return canvas.document(page.width(), page.height(), title + ": " + subtitle(), told());
  }

  /**
   * Draws it as PNG, two pixels a point.
   *
   * @return the bytes of the file
   * @throws NoFontException if the machine has no font to write its text with
   */
  public byte[] png() throws NoFontException {
    Page page = page();
    PngCanvas canvas = PngCanvas.blank(page.width(), page.height());
    draw(canvas, page);
    return canvas.bytes();
  }

  private void draw(Canvas canvas, Page page) {
    page.drawGround(canvas);
    new LedgerDrawing(flows, page.panel().frame()).draw(canvas);
    page.drawWords(canvas);
  }

  private Page page() {
    return Page.of(
        new Page.Content(
            title,
            subtitle(),
            state(),
            new Box(0, 0, WIDTH, HEIGHT),
            new Page.Gutters(0, 0, 0, 0),
            Optional.empty(),
            key()));
  }

  private String subtitle() {
    return "Heat over the boundary of the building, "
        + Digits.shortest(ledger.climate().days(), 2)
        + " days · kWh, widths to scale";
  }

  private String state() {
    return ledger.outcome() instanceof Ledger.Designed ? "as designed" : "by its meters";
  }

  /** What a reader who cannot see the figure is told. */
  private String told() {
    StringBuilder out = new StringBuilder("Heat in and out. In:");
    for (Flows.Band band : flows.in()) {
      out.append(' ').append(band.name()).append(' ').append(band.figure()).append(" kWh;");
    }
    out.append(" out:");
    for (Flows.Band band : flows.out()) {
      out.append(' ').append(band.name()).append(' ').append(band.figure()).append(" kWh;");
    }
    return out.append(" their sum is zero.").toString();
  }

  private static String number(Uncertain number, int decimals) {
    return Digits.between(number.value(), number.lower(), number.upper(), decimals).value();
  }

  /** kWh with their ±, where they have one. */
  private static String energy(Uncertain number) {
    double half = Math.max(number.halfWidth(), number.tolerance());
    if (half <= 1e-12 * Math.abs(number.value())) {
      return number(number, 0) + unit("kWh");
    }
    return Digits.between(number.value(), number.widestLower(), number.widestUpper(), 0).text()
        + unit("kWh");
  }

  private static String unit(String unit) {
    return Figures.JOINED + unit;
  }

  private Key key() {
    Key key = new Key();
    if (ledger.outcome() instanceof Ledger.Designed outcome) {
      key.heading("To buy");
      key.row("heat needed", energy(outcome.needKWh()));
      for (Entry entry : ledger.entries()) {
        if (entry.in() && entry.kind() != Entry.Kind.GAIN && entry.kind() != Entry.Kind.HEAT) {
          key.row(entry.name(), energy(entry.energyKWh()));
        }
      }
      if (outcome.needKWh().widestUpper() > outcome.needKWh().widestLower()) {
        key.note("±: intervals and tolerances of U, ψ and χ, all at their worst together.");
      }
      if (outcome.gainKWh() > 0) {
        key.row(
            "gains used",
            Digits.fixed(100 * outcome.usedKWh().value() / outcome.gainKWh(), 1) + unit("%"));
      }
    } else if (ledger.outcome() instanceof Ledger.Metered outcome) {
      key.heading("Not explained by the data");
      key.row("remainder", energy(outcome.remainderKWh()));
      key.row("of what came in", Digits.fixed(100 * Math.abs(outcome.share()), 1) + unit("%"));
      key.note(
          outcome.remainderKWh().value() <= 0
              ? "It leaves by other ways: gains not used, opened windows, more air, U and ψ worse"
                  + " than listed."
              : "By the data more leaves than came in: U, ψ or air better than listed, or a cooler"
                  + " inside.");
    }
    transfer(key);
    junctions(key);
    period(key);
    return key;
  }

  private void transfer(Key key) {
    Envelope envelope = ledger.envelope();
    key.heading("Heat transfer");
    key.row("transmission H_T", number(envelope.transmissionWPerK(), 2) + unit("W/K"));
    key.row("of it junctions and points", number(envelope.bridgesWPerK(), 3) + unit("W/K"));
    Uncertain share = envelope.bridgeShare().times(100);
    key.row("their share", number(share, 2) + unit("%"));
    key.row("mean ΔU", number(envelope.meanDeltaUWPerM2K(), 4) + unit("W/(m²·K)"));
    key.row("air H_V", number(envelope.airWPerK(), 2) + unit("W/K"));
  }

  private void junctions(Key key) {
    List<Envelope.Part> bridges = new ArrayList<>();
    for (Envelope.Part part : ledger.envelope().parts()) {
      if (part.bridge()) {
        bridges.add(part);
      }
    }
    if (bridges.isEmpty()) {
      return;
    }
    bridges.sort(
        (a, b) ->
            Double.compare(
                Math.abs(b.conductanceWPerK().value()), Math.abs(a.conductanceWPerK().value())));
    key.heading("Junctions and points");
    Uncertain rest = Uncertain.ZERO;
    for (int i = 0; i < bridges.size(); i++) {
      Envelope.Part part = bridges.get(i);
      if (i < MOST_JUNCTIONS || bridges.size() == MOST_JUNCTIONS + 1) {
        key.row(part.name(), number(part.conductanceWPerK(), 3) + unit("W/K"));
      } else {
        rest = rest.plus(part.conductanceWPerK());
      }
    }
    if (bridges.size() > MOST_JUNCTIONS + 1) {
      key.row((bridges.size() - MOST_JUNCTIONS) + " others", number(rest, 3) + unit("W/K"));
    }
  }

  private void period(Key key) {
    Climate climate = ledger.climate();
    key.heading("Period");
    key.row("days", Digits.shortest(climate.days(), 2));
    key.row("inside", Digits.shortest(climate.insideC(), 2) + unit("°C"));
    if (climate.baseC().isPresent()) {
      key.row(
          "degree-days to " + Digits.shortest(climate.baseC().getAsDouble(), 2) + unit("°C"),
          Digits.fixed(climate.meanDifferenceK() * climate.days(), 0) + unit("K·d"));
    } else {
      key.row(
          "outside on average",
          Digits.fixed(climate.insideC() - climate.meanDifferenceK(), 1) + unit("°C"));
    }
  }
}
