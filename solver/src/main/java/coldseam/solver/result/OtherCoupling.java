package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import java.util.Optional;

/** A coupling coefficient of one detail for use in another, with what it hangs on. */
public final class OtherCoupling {
  private final Quantity value;
  private final Optional<ByPart> byPart;

  OtherCoupling(Quantity value, Optional<ByPart> byPart) {
    this.value = value;
    this.byPart = byPart;
  }

  Quantity value() {
    return value;
  }

  /** Empty where it is infinite. */
  Optional<ByPart> byPart() {
    return byPart;
  }
}
