package coldseam.cases.building;

import coldseam.cases.CaseException;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Gain;
import coldseam.solver.ledger.Meters;
import coldseam.solver.ledger.Supply;
import coldseam.solver.ledger.Uncertain;
import coldseam.solver.ledger.Utilisation;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A building as read, before the cases it takes ψ from are solved.
 *
 * @param parts of the envelope, air last
 * @param rooms unheated rooms by name
 * @param climate the period
 * @param gains what comes in unbought
 * @param utilisation how much of it is used
 * @param storeKWh what the building holds more at the end
 * @param supply what is bought in a design
 * @param meters what went in and out; empty for a design
 */
record Draft(
    List<Part> parts,
    Map<String, Room> rooms,
    Climate climate,
    List<Gain> gains,
    Utilisation utilisation,
    double storeKWh,
    Supply supply,
    Optional<Meters> meters) {
  /** A part of the envelope. */
  record Part(
      Envelope.Kind kind, String name, double amount, Coefficient coefficient, String room) {}

  /** What of a difference to outdoors acts on an unheated room. */
  sealed interface Room {
    /**
     * Stated, or from its temperature.
     *
     * @param b the factor
     */
    record Stated(double b) implements Room {}

    /**
     * From what the room loses: b = H_ue/(H_iu + H_ue) (ISO 13789).
     *
     * @param outsideWPerK H_ue, from the room to outdoors, its air change included
     * @param airWPerK what air adds to H_iu, from the building to the room
     */
    record ByLoss(double outsideWPerK, double airWPerK) implements Room {}
  }

  /** The envelope with the ψ of the cases put in. */
  Envelope envelope(List<Result> results) throws CaseException {
    List<Envelope.Part> all = new ArrayList<>();
    for (Part part : parts) {
      Uncertain coefficient = part.coefficient().of(results);
      Uncertain b = part.room().isEmpty() ? Uncertain.exact(1) : b(part.room(), results);
      all.add(
          new Envelope.Part(
              part.kind(),
              part.name(),
              part.amount(),
              coefficient,
              part.room(),
              b,
              part.coefficient().source()));
    }
    return new Envelope(all);
  }

  private Uncertain b(String name, List<Result> results) throws CaseException {
    Room room = rooms.get(name);
    if (room instanceof Room.Stated stated) {
      return Uncertain.exact(stated.b());
    }
    Room.ByLoss loss = (Room.ByLoss) room;
    Uncertain inner = Uncertain.exact(loss.airWPerK());
    for (Part part : parts) {
      if (part.room().equals(name)) {
        inner = inner.plus(part.coefficient().of(results).times(part.amount()));
      }
    }
    double outside = loss.outsideWPerK();
    // The smaller the inner conductance, the larger b: both ends change places.
    return new Uncertain(
        b(inner.value(), outside),
        b(inner.upper(), outside),
        b(inner.lower(), outside),
        b(inner.widestUpper(), outside),
        b(inner.widestLower(), outside),
        inner.doubt());
  }

  private static double b(double inner, double outside) {
    double sum = Math.max(0, inner) + outside;
    return sum > 0 ? outside / sum : 1;
  }
}
