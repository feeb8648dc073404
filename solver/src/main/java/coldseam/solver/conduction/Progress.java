package coldseam.solver.conduction;

/** Told after each pass of the adaptive loop; can end the work. */
@FunctionalInterface
public interface Progress {
  /** Listens to nothing and never cancels. */
  Progress SILENT =
      new Progress() {
        @Override
        public boolean pass(String stage, int pass, int unknowns, double relativeError) {
          return true;
        }
      };

  /**
   * A pass is done.
   *
   * @param stage what is being solved, in a few words
   * @param pass its number, from 1
   * @param unknowns unknowns of the temperature problem in this pass
   * @param relativeError estimate or half-width of the worst quantity, relative to what is asked (1
   *     means just met)
   * @return false to cancel: the solver then throws {@link
   *     java.util.concurrent.CancellationException}
   */
  boolean pass(String stage, int pass, int unknowns, double relativeError);
}
