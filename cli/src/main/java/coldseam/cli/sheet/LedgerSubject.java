package coldseam.cli.sheet;

import coldseam.cases.building.BuildingAccount;
import coldseam.solver.detail.Assumption;
import java.util.List;

/**
 * A building and its ledger.
 *
 * @param subject title and file
 * @param account the ledger
 * @param parts the cases that were solved for it
 * @param assumptions everything chosen for the user
 */
public record LedgerSubject(
    Subject subject,
    BuildingAccount account,
    List<WindowSubject.Part> parts,
    List<Assumption> assumptions) {
  /** Copies the lists. */
  public LedgerSubject {
    parts = List.copyOf(parts);
    assumptions = List.copyOf(assumptions);
  }
}
