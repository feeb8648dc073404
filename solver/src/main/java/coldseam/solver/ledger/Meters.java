package coldseam.solver.ledger;

import java.util.ArrayList;
import java.util.List;

/**
 * What went in and out by meter, or was typed as if it had.
 *
 * @param electricityKWh from the grid
 * @param photovoltaicsKWh made on the building, all of it
 * @param exportedKWh of that or of the grid's, given away
 * @param heatKWh bought as heat
 * @param ambientKWh taken in by a heat pump
 * @param drainKWh warm water down the drain
 * @param fuels used
 */
public record Meters(
    double electricityKWh,
    double photovoltaicsKWh,
    double exportedKWh,
    double heatKWh,
    double ambientKWh,
    double drainKWh,
    List<Burnt> fuels) {
  /**
   * A fuel that was used.
   *
   * @param fuel with its appliance
   * @param used units of it
   */
  public record Burnt(Fuel fuel, double used) {
    /** Its heat by the heating value, kWh. */
    public double energyKWh() {
      return used * fuel.heatingValueKWh();
    }
  }

  /** Copies the list. */
  public Meters {
    fuels = List.copyOf(fuels);
  }

  /** The items, those that are not 0. */
  List<Entry> entries() {
    List<Entry> entries = new ArrayList<>();
    add(entries, Entry.Kind.ELECTRICITY, "electricity from the grid", electricityKWh);
    add(entries, Entry.Kind.PHOTOVOLTAICS, "photovoltaics", photovoltaicsKWh);
    for (Burnt burnt : fuels) {
      add(entries, Entry.Kind.FUEL, burnt.fuel().name(), burnt.energyKWh());
    }
    add(entries, Entry.Kind.HEAT, "heat bought", heatKWh);
    add(entries, Entry.Kind.AMBIENT, "ambient heat", ambientKWh);
    add(entries, Entry.Kind.EXPORT, "electricity exported", -exportedKWh);
    for (Burnt burnt : fuels) {
      double loss = burnt.energyKWh() * (1 - burnt.fuel().efficiency());
      add(entries, Entry.Kind.FLUE, "flue, " + burnt.fuel().name(), -loss);
    }
    add(entries, Entry.Kind.DRAIN, "warm water to drain", -drainKWh);
    return entries;
  }

  private static void add(List<Entry> entries, Entry.Kind kind, String name, double energyKWh) {
    if (energyKWh != 0) {
      entries.add(new Entry(kind, name, Uncertain.exact(energyKWh)));
    }
  }
}
