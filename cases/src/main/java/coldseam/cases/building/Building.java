package coldseam.cases.building;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Utilisation;
import coldseam.solver.result.Result;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A building file that was read without a problem. Immutable. */
public final class Building {
  /** A month is not longer, days. */
  private static final double LONGEST_MONTH = 31;

  private final Path file;
  private final String title;
  private final Optional<DimensionSystem> dimensions;
  private final Draft draft;
  private final List<Part> parts;
  private final List<Assumption> assumptions;

  /**
   * A case that the building takes ψ from.
   *
   * @param name its file as typed, and its variant
   * @param from the case
   * @param variant the variant meant, empty for the base case
   */
  public record Part(String name, Case from, Optional<String> variant) {}

  Building(
      Path file,
      String title,
      Optional<DimensionSystem> dimensions,
      Draft draft,
      List<Part> parts,
      List<Assumption> assumptions) {
    this.file = file;
    this.title = title;
    this.dimensions = dimensions;
    this.draft = draft;
    this.parts = List.copyOf(parts);
    this.assumptions = List.copyOf(assumptions);
  }

  /** The file. */
  public Path file() {
    return file;
  }

  /** The title typed in it. */
  public String title() {
    return title;
  }

  /** The cases that have to be solved, each once. */
  public List<Part> parts() {
    return parts;
  }

  /** Everything chosen for the user. */
  public List<Assumption> assumptions() {
    return assumptions;
  }

  /**
   * Draws up the account.
   *
   * @param results of {@link #parts()}, in their order
   * @return the ledger with what may not fit together in it
   * @throws CaseException if a ψ does not come out of its case
   */
  public BuildingAccount account(List<Result> results) throws CaseException {
    Envelope envelope = draft.envelope(results);
    Ledger ledger =
        draft.meters().isPresent()
            ? Ledger.metered(
                envelope, draft.climate(), draft.gains(), draft.storeKWh(), draft.meters().get())
            : designed(envelope, draft.utilisation());
    return new BuildingAccount(ledger, dimensions, warnings(envelope, ledger));
  }

  private Ledger designed(Envelope envelope, Utilisation utilisation) {
    return Ledger.designed(
        envelope, draft.climate(), draft.gains(), utilisation, draft.storeKWh(), draft.supply());
  }

  private List<String> warnings(Envelope envelope, Ledger ledger) {
    List<String> warnings = new ArrayList<>();
    for (Envelope.Part part : envelope.parts()) {
      if (!part.coefficient().proved()) {
        warnings.add(
            "the ψ of `"
                + part.name()
                + "` is not certified ("
                + part.coefficient().doubt()
                + "): what it adds to a ± is an estimate");
      }
    }
    if (ledger.outcome() instanceof Ledger.Designed) {
      monthly(envelope).ifPresent(warnings::add);
    } else if (draft.climate().gainsInBase() && draft.meters().get().electricityKWh() > 0) {
      warnings.add(
          "the base of the degree-days stands for gains, those of electricity used indoors among"
              + " them: the remainder counts them twice. A base equal to the inside temperature"
              + " keeps them apart");
    }
    return warnings;
  }

  /** The monthly parameters over a longer step, and what the seasonal ones would give. */
  private Optional<String> monthly(Envelope envelope) {
    boolean longer = false;
    for (Climate.Step step : draft.climate().steps()) {
      longer |= step.days() > LONGEST_MONTH;
    }
    if (!longer
        || draft.gains().isEmpty()
        || !(draft.utilisation() instanceof Utilisation.ByTimeConstant by)
        || by.a0() != Utilisation.ByTimeConstant.MONTHLY_A0
        || by.tau0H() != Utilisation.ByTimeConstant.MONTHLY_TAU0_H) {
      return Optional.empty();
    }
    Utilisation seasonal =
        new Utilisation.ByTimeConstant(
            by.capacityJPerK(),
            Utilisation.ByTimeConstant.SEASONAL_A0,
            Utilisation.ByTimeConstant.SEASONAL_TAU0_H);
    Ledger.Designed other = (Ledger.Designed) designed(envelope, seasonal).outcome();
    return Optional.of(
        "use of gains by the monthly parameters (a0 1, τ0 15 h) although the period is a season;"
            + " by the seasonal ones (a0 0.8, τ0 30 h) the heat needed would be "
            + BigDecimal.valueOf(other.needKWh().value())
                .setScale(0, RoundingMode.HALF_EVEN)
                .toPlainString()
            + " kWh");
  }
}
