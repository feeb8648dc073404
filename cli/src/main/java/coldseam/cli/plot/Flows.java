package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Uncertain;
import java.util.ArrayList;
import java.util.List;

/**
 * What the figure of a ledger shows as bands: items, those of junctions and points in one, the
 * smallest summed up where there are too many to be read.
 *
 * @param in bands that come in, in the order of the account
 * @param out bands that go out
 */
record Flows(List<Band> in, List<Band> out) {
  private static final int MOST_BANDS = 14;

  /** How a band looks. */
  enum Look {
    BOUGHT,
    GAIN,
    PLANE,
    BRIDGES,
    AIR,
    UNUSED,
    REMAINDER
  }

  /**
   * One band.
   *
   * @param name what it is
   * @param look how it is filled
   * @param energy kWh, more than 0
   */
  record Band(String name, Look look, Uncertain energy) {
    double size() {
      return energy.value();
    }

    /** kWh without the unit. */
    String figure() {
      return Digits.between(energy.value(), energy.lower(), energy.upper(), 0).value();
    }
  }

  static Flows of(Ledger ledger) {
    List<Band> in = new ArrayList<>();
    List<Band> out = new ArrayList<>();
    Uncertain bridges = Uncertain.ZERO;
    int bridge = -1;
    for (Entry entry : ledger.entries()) {
      if (entry.kind() == Entry.Kind.JUNCTION || entry.kind() == Entry.Kind.POINT) {
        bridges = bridges.plus(entry.energyKWh());
        bridge = bridge < 0 ? out.size() : bridge;
      } else {
        add(in, out, name(entry), look(entry.kind()), entry.energyKWh());
      }
    }
    if (bridge >= 0 && bridges.value() <= 0) {
      List<Band> behind = new ArrayList<>(out.subList(bridge, out.size()));
      out.subList(bridge, out.size()).clear();
      add(in, out, "junctions and points", Look.BRIDGES, bridges);
      out.addAll(behind);
    } else if (bridge >= 0) {
      add(in, out, "junctions and points, less than nothing", Look.BRIDGES, bridges);
    }
    return new Flows(readable(in), readable(out));
  }

  private static void add(List<Band> in, List<Band> out, String name, Look look, Uncertain energy) {
    if (energy.value() > 0) {
      in.add(new Band(name, look, energy));
    } else if (energy.value() < 0) {
      out.add(new Band(name, look, energy.times(-1)));
    }
  }

  private static String name(Entry entry) {
    return switch (entry.kind()) {
      case ROOM -> "by way of " + entry.name();
      case GROUND -> entry.name() + ", to the ground";
      case REMAINDER ->
          entry.in() ? "more leaves by the data than came in" : "not explained by the data";
      default -> entry.name();
    };
  }

  private static Look look(Entry.Kind kind) {
    return switch (kind) {
      case GAIN, PHOTOVOLTAICS, AMBIENT -> Look.GAIN;
      case ELECTRICITY, FUEL, HEAT -> Look.BOUGHT;
      case JUNCTION, POINT -> Look.BRIDGES;
      case AIR, LEAKAGE, DRAIN -> Look.AIR;
      case UNUSED_GAIN, EXPORT, FLUE, STORE -> Look.UNUSED;
      case REMAINDER -> Look.REMAINDER;
      case ELEMENT, WINDOW, ROOM, GROUND -> Look.PLANE;
    };
  }

  /** The bands, the smallest summed up if there are too many; what the figure is for stays. */
  private static List<Band> readable(List<Band> bands) {
    List<Band> left = new ArrayList<>(bands);
    Uncertain rest = Uncertain.ZERO;
    int count = 0;
    while (left.size() + (count > 0 ? 1 : 0) > MOST_BANDS) {
      int least = -1;
      for (int i = 0; i < left.size(); i++) {
        Look look = left.get(i).look();
        boolean stays = look == Look.REMAINDER || look == Look.BRIDGES;
        if (!stays && (least < 0 || left.get(i).size() < left.get(least).size())) {
          least = i;
        }
      }
      rest = rest.plus(left.remove(least).energy());
      count++;
    }
    if (count > 0) {
      left.add(new Band(count + " others", Look.UNUSED, rest));
    }
    return List.copyOf(left);
  }

  /** Everything that comes in, kWh. */
  Uncertain sum() {
    Uncertain sum = Uncertain.ZERO;
    for (Band band : in) {
      sum = sum.plus(band.energy());
    }
    return sum;
  }
}
