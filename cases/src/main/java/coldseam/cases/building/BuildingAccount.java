package coldseam.cases.building;

import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.ledger.Ledger;
import java.util.List;
import java.util.Optional;

/**
 * The ledger of a building, and what may not fit together in it.
 *
 * @param ledger the account
 * @param dimensions how areas and lengths are measured; empty if the building has no junctions and
 *     does not say
 * @param warnings sentences, each with its figures
 */
public record BuildingAccount(
    Ledger ledger, Optional<DimensionSystem> dimensions, List<String> warnings) {
  /** Copies the list. */
  public BuildingAccount {
    warnings = List.copyOf(warnings);
  }
}
