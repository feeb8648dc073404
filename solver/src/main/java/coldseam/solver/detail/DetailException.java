package coldseam.solver.detail;

import java.util.List;

/** The detail cannot be solved as it stands: bad input, not a defect of the solver. */
public final class DetailException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<Fault> faults;

  /**
   * Collects faults.
   *
   * @param faults one or more
   */
  public DetailException(List<Fault> faults) {
    super(faults.get(0).message());
    this.faults = List.copyOf(faults);
  }

  /** Everything found at fault. */
  public List<Fault> faults() {
    return faults;
  }
}
