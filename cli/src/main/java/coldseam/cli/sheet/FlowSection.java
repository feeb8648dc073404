package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.result.Result;

/** Heat flows of spaces and stretches with their balance, as rows of the card. */
record FlowSection(Result result, Units units, Ink ink) {
  private static final int MOST_DECIMALS = 3;

  /** A balance that is off by less than this part of what flows is off by rounding alone. */
  private static final double ROUNDING = 1e-9;

  void write(Manuscript text) {
    text.heading(
        "Heat flow",
        counted().flowUnit() + ", positive into the detail; ± estimated; films for heat loss");
    Table table =
        new Table("lrrrl", 2, TextCard.PAGE)
            .named("space or stretch", "temperature", "heat flow", "±", "note");
    for (Result.SpaceResult space : result.spaces()) {
      row(
          table,
          space.name(),
          temperature(space.temperatureC()),
          space.heatFlowWPerM(),
          halfWidth(space.name()),
          space.floating() ? "its temperature follows from the others" : "");
    }
    double worst = 0;
    for (Result.SpaceResult space : result.spaces()) {
      worst = Math.max(worst, halfWidth(space.name()));
    }
    for (Result.StretchResult stretch : result.stretches()) {
      String facing = stretch.space().isEmpty() ? "" : ", facing " + stretch.space();
      row(
          table,
          "through " + stretch.name(),
          "",
          stretch.heatFlowWPerM(),
          worst,
          units.length(stretch.lengthM()) + " " + units.unit() + facing);
    }
    table.row(
        "balance",
        "",
        Digits.fixed(result.balance().sumWPerM(), 2),
        "",
        ink.faint(balance(Math.abs(result.balance().relative()))));
    text.table(table);
  }

  private Counted counted() {
    return Counted.of(result);
  }

  private static String balance(double relative) {
    return relative <= ROUNDING
        ? "what flows in flows out"
        : "in and out differ by " + Digits.magnitude(relative) + " of what flows";
  }

  private void row(
      Table table, String name, String temperature, double flow, double halfWidth, String note) {
    Digits.Figure figure = Digits.of(flow, halfWidth, MOST_DECIMALS);
    table.row(
        name,
        temperature,
        Digits.signed(figure.value()),
        "± " + figure.halfWidth(),
        ink.faint(note));
    if (units.customary()) {
      Digits.Figure us =
          Digits.of(
              flow * counted().customaryFlow(),
              halfWidth * counted().customaryFlow(),
              MOST_DECIMALS);
      table.row(
          "", "", Digits.signed(us.value()), "± " + us.halfWidth(), counted().customaryFlowUnit());
    }
  }

  private String temperature(double celsius) {
    String si = Digits.fixed(celsius, 1) + " °C";
    return units.customary() ? si + " = " + Digits.fixed(Units.fahrenheit(celsius), 1) + " °F" : si;
  }

  /**
   * How far the flow of a space may be off: Σ over its couplings of half-width times difference of
   * temperature, W/m.
   */
  private double halfWidth(String space) {
    double sum = 0;
    for (Result.Coupling coupling : result.couplings()) {
      if (coupling.from().equals(space) || coupling.to().equals(space)) {
        double difference = temperatureOf(coupling.from()) - temperatureOf(coupling.to());
        if (difference != 0) {
          sum += coupling.valueWPerMK().halfWidth() * Math.abs(difference);
        }
      }
    }
    return sum;
  }

  private double temperatureOf(String name) {
    for (Result.SpaceResult space : result.spaces()) {
      if (space.name().equals(name)) {
        return space.temperatureC();
      }
    }
    return Double.NaN;
  }
}
