package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Fuel;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Supply;
import coldseam.solver.ledger.Uncertain;

/** What the items of a ledger are called, and how its numbers are written, the same everywhere. */
final class LedgerWords {
  /** Decimals of W/K and kWh that are taken as typed. */
  private static final int CONDUCTANCE_DECIMALS = 3;

  private static final int ENERGY_DECIMALS = 1;

  private LedgerWords() {}

  /** Items that belong together, in the order of the account. */
  enum Group {
    IN("in"),
    PLANE("plane elements and windows"),
    BRIDGES("junctions and points"),
    ROOMS("by way of unheated rooms"),
    GROUND("to the ground"),
    AIR("air"),
    OTHER("otherwise"),
    REMAINDER("not explained by the data");

    private final String words;

    Group(String words) {
      this.words = words;
    }

    String words() {
      return words;
    }
  }

  static Group group(Entry entry) {
    if (entry.kind() == Entry.Kind.REMAINDER) {
      return Group.REMAINDER;
    }
    if (entry.in()) {
      return Group.IN;
    }
    return switch (entry.kind()) {
      case ELEMENT, WINDOW -> Group.PLANE;
      case JUNCTION, POINT -> Group.BRIDGES;
      case ROOM -> Group.ROOMS;
      case GROUND -> Group.GROUND;
      case AIR, LEAKAGE -> Group.AIR;
      default -> Group.OTHER;
    };
  }

  /** The word of a kind in data. */
  static String name(Entry.Kind kind) {
    return switch (kind) {
      case ELEMENT -> "element";
      case WINDOW -> "window";
      case JUNCTION -> "junction";
      case POINT -> "point";
      case ROOM -> "unheated";
      case GROUND -> "ground";
      case AIR -> "air";
      case LEAKAGE -> "leakage";
      case GAIN -> "gain";
      case UNUSED_GAIN -> "unused-gain";
      case ELECTRICITY -> "electricity";
      case PHOTOVOLTAICS -> "photovoltaics";
      case EXPORT -> "export";
      case FUEL -> "fuel";
      case FLUE -> "flue";
      case HEAT -> "heat";
      case AMBIENT -> "ambient";
      case DRAIN -> "drain";
      case STORE -> "store";
      case REMAINDER -> "remainder";
    };
  }

  /** The word of a kind of part in data. */
  static String name(Envelope.Kind kind) {
    return switch (kind) {
      case ELEMENT -> "element";
      case WINDOW -> "window";
      case JUNCTION -> "junction";
      case POINT -> "point";
      case GROUND -> "ground";
      case AIR -> "air";
      case LEAKAGE -> "leakage";
    };
  }

  /** Where a part leads. */
  static String to(Envelope.Part part) {
    if (part.ground()) {
      return "ground";
    }
    return part.room().isEmpty() ? "outdoors" : part.room();
  }

  static String basis(Fuel.Basis basis) {
    return basis == Fuel.Basis.GROSS ? "gross" : "net";
  }

  /** W/K, with no digit that its interval does not reach. */
  static String conductance(Uncertain number) {
    return figure(number, CONDUCTANCE_DECIMALS);
  }

  /** kWh with its sign. */
  static String energy(Uncertain number) {
    return Digits.signed(figure(number, ENERGY_DECIMALS));
  }

  /** kWh without a sign where it is positive. */
  static String amount(Uncertain number) {
    return figure(number, ENERGY_DECIMALS);
  }

  private static String figure(Uncertain number, int decimals) {
    return exact(number)
        ? Digits.fixed(number.value(), decimals)
        : Digits.between(number.value(), number.lower(), number.upper(), decimals).value();
  }

  /** The ± of a number; empty if it is taken as typed. */
  static String halfWidth(Uncertain number, int decimals) {
    return exact(number)
        ? ""
        : "± "
            + Digits.between(number.value(), number.lower(), number.upper(), decimals).halfWidth();
  }

  static String energyHalfWidth(Uncertain number) {
    return halfWidth(number, ENERGY_DECIMALS);
  }

  static String conductanceHalfWidth(Uncertain number) {
    return halfWidth(number, CONDUCTANCE_DECIMALS);
  }

  /** The ± for tolerances, in brackets; empty if there are none. */
  static String tolerance(Uncertain number, int decimals) {
    return significant(number.tolerance(), number)
        ? "(± " + Digits.outward(number.tolerance(), 2, decimals) + ")"
        : "";
  }

  static String energyTolerance(Uncertain number) {
    return tolerance(number, ENERGY_DECIMALS);
  }

  static String conductanceTolerance(Uncertain number) {
    return tolerance(number, CONDUCTANCE_DECIMALS);
  }

  /** Whether a number is taken as it stands: what rounding leaves of its interval is none. */
  private static boolean exact(Uncertain number) {
    return !significant(number.halfWidth(), number);
  }

  private static boolean significant(double halfWidth, Uncertain number) {
    return halfWidth > 1e-12 * Math.abs(number.value());
  }

  /** What a design buys, in words; empty if it is heat itself. */
  static String bought(Ledger.Designed outcome) {
    Uncertain bought = outcome.boughtKWh();
    if (outcome.supply() instanceof Supply.Burnt burnt) {
      Fuel fuel = burnt.fuel();
      Uncertain units = bought.times(1 / fuel.heatingValueKWh());
      return fuel.name()
          + ", "
          + Digits.shortest(100 * fuel.efficiency(), 2)
          + " % efficiency, "
          + basis(fuel.basis())
          + ": "
          + figure(units, 2)
          + " "
          + fuel.unit()
          + " at "
          + Digits.shortest(fuel.heatingValueKWh(), 4)
          + " kWh/"
          + fuel.unit();
    }
    if (outcome.supply() instanceof Supply.HeatPump pump) {
      return "electricity, performance " + Digits.shortest(pump.performance(), 3);
    }
    return "";
  }

  /** What is said of a remainder. */
  static String remainder(Ledger.Metered outcome) {
    double remainder = outcome.remainderKWh().value();
    String share = Digits.fixed(100 * Math.abs(outcome.share()), 1) + " % of what came in";
    return remainder <= 0
        ? share
            + ": leaves by ways that the data does not explain, such as gains that were not used,"
            + " opened windows, air change above the stated one, or U and ψ worse than listed"
        : share
            + ": by the data more leaves than came in, such as U, ψ or air change better than"
            + " listed, or a cooler inside";
  }
}
