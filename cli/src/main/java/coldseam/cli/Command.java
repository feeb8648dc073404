package coldseam.cli;

/** One command of the program. */
interface Command {
  /** What may be typed after its name. */
  Syntax syntax();

  /**
   * Carries it out.
   *
   * @param typed what was typed
   * @param here where it runs
   * @return the exit code
   * @throws Exception bad input or a defect; {@link Failure} tells them apart
   */
  int run(Syntax.Typed typed, Surroundings here) throws Exception;
}
