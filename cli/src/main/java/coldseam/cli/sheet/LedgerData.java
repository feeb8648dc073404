package coldseam.cli.sheet;

import coldseam.cli.text.Json;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Fuel;
import coldseam.solver.ledger.GainUse;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Supply;
import coldseam.solver.ledger.Uncertain;

/** A ledger as one JSON object, and as two tables of comma-separated values. */
record LedgerData(LedgerSubject of) {
  private static final String KWH = "kWh";
  private static final String PER_K = "W_per_K";

  String json(boolean indented) {
    Json json = indented ? Json.indented() : Json.onOneLine();
    Ledger ledger = of.account().ledger();
    json.object()
        .member("coldseam", of.subject().version())
        .member("building", of.subject().title())
        .member("file", of.subject().file());
    if (of.account().dimensions().isPresent()) {
      json.member("dimensions", Words.name(of.account().dimensions().get()));
    } else {
      json.nothing("dimensions");
    }
    climate(json, ledger.climate());
    schedule(json, ledger.envelope());
    transfer(json, ledger.envelope());
    json.array("account");
    for (Entry entry : ledger.entries()) {
      json.object()
          .member("kind", LedgerWords.name(entry.kind()))
          .member("name", entry.name())
          .member("side", entry.in() ? "in" : "out");
      number(json, entry.energyKWh(), KWH);
      json.endObject();
    }
    json.endArray();
    json.member("sum_kWh", ledger.sumKWh()).member("relativeSum", ledger.relativeSum());
    outcome(json, ledger);
    json.array("cases");
    for (WindowSubject.Part part : of.parts()) {
      json.object()
          .member("name", part.name())
          .member("reached", part.reached())
          .member("unknowns", part.unknowns())
          .endObject();
    }
    json.endArray();
    JsonResults.assumptions(json, of.assumptions());
    json.member("warnings", of.account().warnings());
    json.member("note", Words.SAFETY);
    return json.endObject().text();
  }

  /** Value, ends as stated, ends over tolerances, whether they are bounds. */
  private static void number(Json json, Uncertain number, String unit) {
    json.member("value_" + unit, number.value())
        .member("lower_" + unit, number.lower())
        .member("upper_" + unit, number.upper())
        .member("widestLower_" + unit, number.widestLower())
        .member("widestUpper_" + unit, number.widestUpper())
        .member("bound", number.proved());
  }

  private static void climate(Json json, Climate climate) {
    json.object("climate").member("inside_C", climate.insideC()).member("days", climate.days());
    if (climate.baseC().isPresent()) {
      json.member("base_C", climate.baseC().getAsDouble());
    } else {
      json.nothing("base_C");
    }
    json.array("steps");
    for (Climate.Step step : climate.steps()) {
      json.object()
          .member("name", step.name())
          .member("days", step.days())
          .member("outdoor_Kd", step.outdoorKelvinDays());
      if (step.groundKelvinDays().isPresent()) {
        json.member("ground_Kd", step.groundKelvinDays().getAsDouble());
      } else {
        json.nothing("ground_Kd");
      }
      json.endObject();
    }
    json.endArray().endObject();
  }

  private static String amount(Envelope.Part part) {
    return switch (part.kind()) {
      case JUNCTION -> "length_m";
      case POINT -> "number";
      case AIR, LEAKAGE -> "airFlow_m3_per_h";
      default -> "area_m2";
    };
  }

  private static String coefficient(Envelope.Part part) {
    return switch (part.kind()) {
      case JUNCTION -> "psi";
      case POINT -> "chi";
      case AIR, LEAKAGE -> "heatOfAir";
      default -> "U";
    };
  }

  private static String coefficientUnit(Envelope.Part part) {
    return switch (part.kind()) {
      case JUNCTION -> "W_per_mK";
      case POINT -> PER_K;
      case AIR, LEAKAGE -> "Wh_per_m3K";
      default -> "W_per_m2K";
    };
  }

  private static void schedule(Json json, Envelope envelope) {
    double transmission = envelope.transmissionWPerK().value();
    json.array("schedule");
    for (Envelope.Part part : envelope.parts()) {
      json.object()
          .member("kind", LedgerWords.name(part.kind()))
          .member("name", part.name())
          .member("to", LedgerWords.to(part))
          .member("b", part.b().value())
          .member(amount(part), part.amount());
      json.object(coefficient(part));
      number(json, part.coefficient(), coefficientUnit(part));
      json.endObject().object("H");
      number(json, part.conductanceWPerK(), PER_K);
      json.endObject();
      if (part.air()) {
        json.nothing("shareOfTransmission");
      } else {
        json.member("shareOfTransmission", part.conductanceWPerK().value() / transmission);
      }
      if (part.source().isEmpty()) {
        json.nothing("source");
      } else {
        json.member("source", part.source());
      }
      json.endObject();
    }
    json.endArray();
  }

  private static void transfer(Json json, Envelope envelope) {
    json.object("transmission");
    number(json, envelope.transmissionWPerK(), PER_K);
    json.endObject().object("junctions");
    number(json, envelope.bridgesWPerK(), PER_K);
    Uncertain share = envelope.bridgeShare();
    json.object("share")
        .member("value", share.value())
        .member("lower", share.lower())
        .member("upper", share.upper())
        .member("widestLower", share.widestLower())
        .member("widestUpper", share.widestUpper())
        .member("bound", share.proved())
        .endObject();
    json.object("meanDeltaU");
    number(json, envelope.meanDeltaUWPerM2K(), "W_per_m2K");
    json.endObject().member("envelopeArea_m2", envelope.areaM2()).endObject();
    json.object("air");
    number(json, envelope.airWPerK(), PER_K);
    json.endObject();
  }

  private static void outcome(Json json, Ledger ledger) {
    json.object("outcome");
    if (ledger.outcome() instanceof Ledger.Designed outcome) {
      json.member("side", "design").object("need");
      number(json, outcome.needKWh(), KWH);
      json.endObject().object("loss");
      number(json, outcome.lossKWh(), KWH);
      json.endObject().object("gains").member("sum_kWh", outcome.gainKWh()).object("used");
      number(json, outcome.usedKWh(), KWH);
      json.endObject().array("steps");
      for (GainUse.Step step : outcome.steps()) {
        json.object()
            .member("name", step.name())
            .member("loss_kWh", step.lossKWh())
            .member("gain_kWh", step.gainKWh())
            .member("ratio", step.use().ratio())
            .member("H_W_per_K", step.conductanceWPerK())
            .member("timeConstant_h", step.use().timeConstantH())
            .member("exponent", step.use().exponent())
            .member("factor", step.use().factor())
            .member("used_kWh", step.usedKWh())
            .endObject();
      }
      json.endArray().endObject();
      bought(json, outcome);
    } else if (ledger.outcome() instanceof Ledger.Metered outcome) {
      json.member("side", "metered").object("cameIn");
      number(json, outcome.cameInKWh(), KWH);
      json.endObject().object("wentOut");
      number(json, outcome.wentOutKWh(), KWH);
      json.endObject().object("remainder");
      number(json, outcome.remainderKWh(), KWH);
      json.endObject()
          .member("share", outcome.share())
          .member("meaning", LedgerWords.remainder(outcome));
    }
    json.endObject();
  }

  private static void bought(Json json, Ledger.Designed outcome) {
    json.object("bought");
    if (outcome.supply() instanceof Supply.Burnt burnt) {
      Fuel fuel = burnt.fuel();
      json.member("kind", "fuel")
          .member("fuel", fuel.name())
          .member("basis", LedgerWords.basis(fuel.basis()))
          .member("efficiency", fuel.efficiency())
          .member("heatingValue_kWh_per_unit", fuel.heatingValueKWh())
          .member("unit", fuel.unit())
          .member("units", outcome.boughtKWh().value() / fuel.heatingValueKWh());
    } else if (outcome.supply() instanceof Supply.HeatPump pump) {
      json.member("kind", "electricity").member("performance", pump.performance());
    } else {
      json.member("kind", "heat");
    }
    number(json, outcome.boughtKWh(), KWH);
    json.endObject();
  }

  /** The account, one row an item, then the sum and the words on every sheet. */
  String account() {
    StringBuilder text =
        new StringBuilder(
            "file,side,kind,name,value_kWh,lower_kWh,upper_kWh,widestLower_kWh,widestUpper_kWh,"
                + "bound\n");
    Ledger ledger = of.account().ledger();
    for (Entry entry : ledger.entries()) {
      row(text, entry.in() ? "in" : "out", LedgerWords.name(entry.kind()), entry.name());
      numbers(text, entry.energyKWh());
    }
    row(text, "", "sum", "sum");
    numbers(text, Uncertain.exact(ledger.sumKWh()));
    row(text, "", "note", Words.SAFETY);
    return text.append(",,,,,\n").toString();
  }

  /** The schedule, one row a part, then the sums and the words on every sheet. */
  String schedule() {
    StringBuilder text =
        new StringBuilder(
            "file,kind,name,to,b,area_m2,length_m,number,airFlow_m3_per_h,U_W_per_m2K,psi_W_per_mK,"
                + "chi_W_per_K,value_W_per_K,lower_W_per_K,upper_W_per_K,widestLower_W_per_K,"
                + "widestUpper_W_per_K,bound,shareOfTransmission,source\n");
    Envelope envelope = of.account().ledger().envelope();
    double transmission = envelope.transmissionWPerK().value();
    for (Envelope.Part part : envelope.parts()) {
      boolean plane = part.plane();
      boolean length = part.kind() == Envelope.Kind.JUNCTION;
      boolean point = part.kind() == Envelope.Kind.POINT;
      text.append(quoted(of.subject().file()))
          .append(',')
          .append(LedgerWords.name(part.kind()))
          .append(',')
          .append(quoted(part.name()))
          .append(',')
          .append(quoted(LedgerWords.to(part)))
          .append(',')
          .append(part.b().value());
      cell(text, plane, part.amount());
      cell(text, length, part.amount());
      cell(text, point, part.amount());
      cell(text, part.air(), part.amount());
      cell(text, plane, part.coefficient().value());
      cell(text, length, part.coefficient().value());
      cell(text, point, part.coefficient().value());
      text.append(',');
      ends(text, part.conductanceWPerK());
      cell(text, !part.air(), part.conductanceWPerK().value() / transmission);
      text.append(',').append(quoted(part.source())).append('\n');
    }
    sum(text, "transmission", envelope.transmissionWPerK(), envelope.areaM2(), 1);
    sum(
        text,
        "junctions and points",
        envelope.bridgesWPerK(),
        Double.NaN,
        envelope.bridgeShare().value());
    sum(text, "air", envelope.airWPerK(), Double.NaN, Double.NaN);
    return text.append(quoted(of.subject().file()))
        .append(",note,")
        .append(quoted(Words.SAFETY))
        .append(",".repeat(17))
        .append('\n')
        .toString();
  }

  private void sum(StringBuilder text, String name, Uncertain h, double area, double share) {
    text.append(quoted(of.subject().file())).append(",sum,").append(name).append(",,");
    cell(text, Double.isFinite(area), area);
    text.append(",,,,,,,");
    ends(text, h);
    cell(text, Double.isFinite(share), share);
    text.append(",\n");
  }

  private static void cell(StringBuilder text, boolean filled, double number) {
    text.append(',');
    if (filled) {
      text.append(number);
    }
  }

  private void row(StringBuilder text, String side, String kind, String name) {
    text.append(quoted(of.subject().file()))
        .append(',')
        .append(side)
        .append(',')
        .append(kind)
        .append(',')
        .append(quoted(name))
        .append(',');
  }

  private static void numbers(StringBuilder text, Uncertain number) {
    ends(text, number);
    text.append('\n');
  }

  private static void ends(StringBuilder text, Uncertain number) {
    text.append(number.value())
        .append(',')
        .append(number.lower())
        .append(',')
        .append(number.upper())
        .append(',')
        .append(number.widestLower())
        .append(',')
        .append(number.widestUpper())
        .append(',')
        .append(number.proved());
  }

  private static String quoted(String value) {
    return CsvResults.quoted(value);
  }
}
