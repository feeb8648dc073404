package coldseam.cases.study;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Changes;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Finds the smallest (or largest) value of a range at which a target is met, to a step. Which steps
 * meet it is decided by intervals; where an interval straddles the target the step is solved again
 * more accurately, and what still cannot be told counts as not met. Between the steps solved the
 * number is taken to rise or to fall throughout; that the solves themselves do is checked.
 *
 * <p>The steps to solve follow a secant, but never so far from the middle that halving what is left
 * would need more solves than {@link #MOST_SOLVES} leaves.
 */
public final class Seek {
  /** A seek ends within so many solves. */
  public static final int MOST_SOLVES = 12;

  /** Steps that a range is divided into unless a step is stated, at most. */
  private static final int USUAL_STEPS = 256;

  /**
   * More steps could not be told apart by halving within the solves allowed, both ends included.
   */
  private static final int MOST_STEPS = 1024;

  private static final MathContext DIGITS = new MathContext(15);

  private static final MathContext TYPED = new MathContext(3, RoundingMode.DOWN);

  /** Parts of the change from step to step that a number is solved to. */
  private static final double PARTS = 6;

  /** How much narrower a straddling interval is asked for than its middle is off the target. */
  private static final double NARROWER = 2.5;

  /** No number is asked for more accurately than this part of what the case asks. */
  private static final double FINEST = 1e-3;

  /** Solves a detail; exchanged in tests. */
  @FunctionalInterface
  public interface Solves {
    /**
     * Solves.
     *
     * @param changes what is changed in the case
     * @param accuracy the half-widths asked for
     * @return the result
     * @throws CaseException if the case so changed is at fault
     */
    Result of(Changes changes, Accuracy accuracy) throws CaseException;
  }

  /**
   * One solve.
   *
   * @param setting the value, as it would be written in the case
   * @param step its place in the range: 0 is the end that is preferred
   * @param measure the number sought
   * @param accuracy the half-widths asked for
   */
  public record Solve(String setting, int step, Measure measure, Accuracy accuracy) {}

  /** How a seek ended. */
  public enum Ending {
    /** The answer meets the target, the step before it does not. */
    FOUND,
    /** The answer is the preferred end of the range itself. */
    MET_AT_END,
    /** No value that was solved meets it. */
    NONE,
    /** Nothing is proved of the number, so nothing can be decided. */
    NOT_CERTIFIED
  }

  /**
   * What came out.
   *
   * @param ending how it ended
   * @param answer the solve of the answer
   * @param before the solve nearest to the answer, on the preferred side, that does not meet the
   *     target; it may be undecided
   * @param adjacent whether no step lies between the two
   * @param monotone whether the solves rise or fall throughout
   * @param solves every solve, in the order made
   */
  public record Outcome(
      Ending ending,
      Optional<Solve> answer,
      Optional<Solve> before,
      boolean adjacent,
      boolean monotone,
      List<Solve> solves) {}

  private final String name;
  private final Range range;
  private final BigDecimal step;
  private final int steps;
  private final boolean largest;
  private final Target target;
  private final Accuracy accuracy;
  private final Solves solving;
  private final List<Solve> solves = new ArrayList<>();

  private Seek(
      String name,
      Range range,
      BigDecimal step,
      boolean largest,
      Target target,
      Accuracy accuracy,
      Solves solving) {
    this.name = name;
    this.range = range;
    this.step = step;
    this.largest = largest;
    this.target = target;
    this.accuracy = accuracy;
    this.solving = solving;
    this.steps = stepsIn(range, step);
  }

  private static int stepsIn(Range range, BigDecimal step) {
    BigDecimal count = range.to().subtract(range.from()).divide(step, 0, RoundingMode.CEILING);
    return count.min(BigDecimal.valueOf(Integer.MAX_VALUE)).intValue();
  }

  /**
   * Prepares a seek.
   *
   * @param from the case
   * @param variant of it, empty for the base case
   * @param set {@code name=from..to}
   * @param stepTyped the step, in the unit of the range; empty for a round one, 256 steps at most
   * @param largest whether the largest value is sought rather than the smallest
   * @param target what is to be met
   * @param accuracy the half-widths to begin with
   * @param solving solves
   * @return the seek
   * @throws StudyException if the range, the step or the value is none
   */
  public static Seek of(
      Case from,
      Optional<String> variant,
      String set,
      Optional<String> stepTyped,
      boolean largest,
      Target target,
      Accuracy accuracy,
      Solves solving)
      throws StudyException {
    int equals = set.indexOf('=');
    String name = equals < 0 ? "" : set.substring(0, equals).strip();
    if (name.isEmpty()) {
      throw new StudyException(
          "\"" + set + "\" sets nothing; write NAME=FROM..TO, e.g. --set insulation=100..300");
    }
    Axis.requireValue(name, from.values(variant).keySet());
    String right = set.substring(equals + 1).strip();
    Range typed = Range.read(name, right);
    if (typed.unit().startsWith("/")) {
      throw new StudyException(
          "\"" + right + "\" has a count of steps; seek takes NAME=FROM..TO and --step");
    }
    boolean rising = typed.from().compareTo(typed.to()) < 0;
    Range range = rising ? typed : new Range(typed.to(), typed.from(), typed.unit());
    if (range.from().compareTo(range.to()) == 0) {
      throw new StudyException("\"" + right + "\" begins where it ends; give two different ends");
    }
    BigDecimal step = stepTyped.isPresent() ? stated(stepTyped.get(), range) : round(range);
    return new Seek(name, range, step, largest, target, accuracy, solving);
  }

  private static BigDecimal stated(String typed, Range range) throws StudyException {
    String number = typed.strip();
    if (!range.unit().isEmpty() && number.endsWith(range.unit())) {
      number = number.substring(0, number.length() - range.unit().length()).strip();
    }
    Optional<BigDecimal> step = Range.number(number);
    if (step.isEmpty() || step.get().signum() <= 0) {
      String in = range.unit().isEmpty() ? "" : " in " + range.unit();
      throw new StudyException("a step is a number above 0" + in + ", not \"" + typed + "\"");
    }
    if (stepsIn(range, step.get()) > MOST_STEPS) {
      throw new StudyException(
          "a step of "
              + typed
              + " divides the range into "
              + stepsIn(range, step.get())
              + "; at most "
              + MOST_STEPS
              + " can be told apart in "
              + MOST_SOLVES
              + " solves");
    }
    return step.get();
  }

  /** 1, 2 or 5 times a power of ten. */
  private static BigDecimal round(Range range) {
    BigDecimal least =
        range.to().subtract(range.from()).divide(BigDecimal.valueOf(USUAL_STEPS), DIGITS);
    BigDecimal power = BigDecimal.ONE.scaleByPowerOfTen(least.precision() - least.scale() - 1);
    for (int times : new int[] {1, 2, 5}) {
      BigDecimal step = power.multiply(BigDecimal.valueOf(times));
      if (step.compareTo(least) >= 0) {
        return step;
      }
    }
    return power.scaleByPowerOfTen(1);
  }

  /** The step, in the unit of the range. */
  public String step() {
    return range.written(step);
  }

  /** The value sought. */
  public String name() {
    return name;
  }

  /**
   * Seeks.
   *
   * @return what came out
   * @throws CaseException if the case is at fault at a value
   * @throws StudyException if the target is ambiguous or the case has no such number
   */
  public Outcome run() throws CaseException, StudyException {
    Solve near = decided(0, accuracy);
    if (near.measure().knowledge() == Measure.Knowledge.OPEN) {
      return outcome(Ending.NOT_CERTIFIED, Optional.empty(), Optional.of(near));
    }
    if (target.met(near.measure())) {
      return outcome(Ending.MET_AT_END, Optional.of(near), Optional.empty());
    }
    Solve far = decided(steps, accuracy);
    if (!target.met(far.measure())) {
      for (int quarter = 1; quarter <= 3; quarter++) {
        int at = Math.round(steps * quarter / 4f);
        if (at > near.step() && at < steps) {
          Solve between = decided(at, accuracy);
          if (target.met(between.measure())) {
            return bracket(near, between);
          }
          near = between;
        }
      }
      return outcome(Ending.NONE, Optional.empty(), Optional.of(far));
    }
    return bracket(near, far);
  }

  private Outcome bracket(Solve missed, Solve met) throws CaseException, StudyException {
    Solve a = missed;
    Solve b = met;
    while (b.step() - a.step() > 1 && solves.size() < MOST_SOLVES) {
      Solve next = decided(next(a, b), accuracyBetween(a, b));
      if (target.met(next.measure())) {
        b = next;
      } else {
        a = next;
      }
    }
    return outcome(Ending.FOUND, Optional.of(b), Optional.of(a));
  }

  private Outcome outcome(Ending ending, Optional<Solve> answer, Optional<Solve> before) {
    boolean adjacent =
        answer.isPresent() && before.isPresent() && answer.get().step() - before.get().step() == 1;
    return new Outcome(ending, answer, before, adjacent, monotone(), List.copyOf(solves));
  }

  /** Where the line through the two solves nearest to the target meets it, rounded away from a. */
  private int next(Solve a, Solve b) {
    int gap = b.step() - a.step();
    double share = share(a, b);
    double at = a.step() + share * gap;
    Optional<Solve> third = beyond(a, b);
    if (third.isPresent()) {
      double along = through(a, b, third.get());
      at = along > a.step() && along < b.step() ? along : at;
    }
    int reach = 1 << Math.max(0, Math.min(30, MOST_SOLVES - solves.size() - 1));
    int least = Math.max(a.step() + 1, b.step() - reach);
    int most = Math.min(b.step() - 1, a.step() + reach);
    int wanted = (int) Math.ceil(at - 1e-9);
    return least > most ? a.step() + gap / 2 : Math.max(least, Math.min(most, wanted));
  }

  private double share(Solve a, Solve b) {
    double fromA = target.limit() - a.measure().value();
    double whole = b.measure().value() - a.measure().value();
    double share = fromA / whole;
    return share >= 0 && share <= 1 ? share : 0.5;
  }

  /** The solve beside the bracket that is nearest to it. */
  private Optional<Solve> beyond(Solve a, Solve b) {
    Optional<Solve> best = Optional.empty();
    int least = Integer.MAX_VALUE;
    for (Solve solve : solves) {
      int away = Math.max(a.step() - solve.step(), solve.step() - b.step());
      if (away > 0 && away < least) {
        least = away;
        best = Optional.of(solve);
      }
    }
    return best;
  }

  /** Inverse quadratic interpolation: the step as a parabola of the number. */
  private double through(Solve a, Solve b, Solve c) {
    double y = target.limit();
    double ya = a.measure().value();
    double yb = b.measure().value();
    double yc = c.measure().value();
    return a.step() * (y - yb) * (y - yc) / ((ya - yb) * (ya - yc))
        + b.step() * (y - ya) * (y - yc) / ((yb - ya) * (yb - yc))
        + c.step() * (y - ya) * (y - yb) / ((yc - ya) * (yc - yb));
  }

  /** So accurate that neighbouring steps can be told apart. */
  private Accuracy accuracyBetween(Solve a, Solve b) {
    double change = Math.abs(b.measure().value() - a.measure().value()) / (b.step() - a.step());
    return narrowed(change / PARTS, b.measure().value());
  }

  /** Solves a step, again more accurately where its interval straddles the target. */
  private Solve decided(int at, Accuracy first) throws CaseException, StudyException {
    Solve solve = solved(at, first);
    for (int again = 0; again < 2; again++) {
      Measure measure = solve.measure();
      boolean straddles = !target.met(measure) && !target.missed(measure);
      double off = Math.abs(measure.value() - target.limit()) / NARROWER;
      if (!straddles
          || measure.knowledge() != Measure.Knowledge.CERTIFIED
          || solves.size() + halvings() >= MOST_SOLVES) {
        break;
      }
      Accuracy finer = narrowed(Math.min(off, halfWidth(measure) / NARROWER), measure.value());
      if (finer.equals(solve.accuracy())) {
        break;
      }
      solve = solved(at, finer);
    }
    return solve;
  }

  private static double halfWidth(Measure measure) {
    return (measure.upper() - measure.lower()) / 2;
  }

  /** Solves that halving still needs at worst. */
  private int halvings() {
    int low = 0;
    int high = steps;
    for (Solve solve : solves) {
      if (target.met(solve.measure())) {
        high = Math.min(high, solve.step());
      } else if (target.missed(solve.measure())) {
        low = Math.max(low, solve.step());
      }
    }
    int gap = Math.max(1, high - low);
    return 32 - Integer.numberOfLeadingZeros(gap - 1) + (solves.size() < 2 ? 1 : 0);
  }

  private Solve solved(int at, Accuracy wanted) throws CaseException, StudyException {
    int place = largest ? steps - at : at;
    BigDecimal value =
        place == steps ? range.to() : range.from().add(step.multiply(BigDecimal.valueOf(place)));
    String setting = range.written(value);
    Result result = solving.of(new Changes(Map.of(name, setting), Map.of()), wanted);
    Solve solve = new Solve(setting, at, target.in(result), wanted);
    solves.add(solve);
    return solve;
  }

  /**
   * The accuracy of the case with a narrower half-width for the number sought, rounded so that it
   * can be typed.
   */
  private Accuracy narrowed(double halfWidth, double value) {
    Accuracy a = accuracy;
    double relative = a.couplingRelative();
    double coupling = a.couplingWPerMK();
    double psi = a.psiWPerMK();
    double u = a.transmittanceRelative();
    double pointRelative = a.pointRelative();
    double point = a.pointWPerK();
    double size = Math.abs(value);
    switch (target.kind()) {
      case PSI -> psi = within(halfWidth, psi);
      case U -> u = within(100 * halfWidth / size, 100 * u) / 100;
      case CHI -> {
        point = within(halfWidth, a.pointWPerK(value));
        pointRelative = 0;
      }
      case L3D -> {
        relative = within(100 * halfWidth / size, 100 * relative) / 100;
        coupling = Double.MAX_VALUE;
      }
      case L2D -> {
        coupling = within(halfWidth, Math.min(coupling, relative * size));
        relative = Double.MAX_VALUE;
      }
      default -> {
        return a;
      }
    }
    return new Accuracy(relative, coupling, psi, u, pointRelative, point, a.mostUnknowns());
  }

  private static double within(double wanted, double asked) {
    double narrow = Double.isNaN(wanted) ? asked : Math.max(FINEST * asked, wanted);
    return BigDecimal.valueOf(Math.min(narrow, asked)).round(TYPED).doubleValue();
  }

  /** Whether no solve is surely on the wrong side of one before it. */
  private boolean monotone() {
    boolean rises = false;
    boolean falls = false;
    for (Solve one : solves) {
      for (Solve other : solves) {
        if (one.step() < other.step()) {
          rises |= one.measure().surelyLess(other.measure());
          falls |= other.measure().surelyLess(one.measure());
        }
      }
    }
    return !(rises && falls);
  }
}
