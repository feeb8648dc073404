package coldseam.cli;

import coldseam.cases.Expectation;
import coldseam.solver.detail.Geometry;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.OptionalDouble;

/**
 * One expectation of a case and what came out.
 *
 * @param expectation what was expected
 * @param computed what came out, in the same unit; empty if there is no such result
 * @param whole whether heat flows are of a whole body of revolution, not of a metre
 */
record Expected(Expectation expectation, OptionalDouble computed, boolean whole) {
  /**
   * Looks up what came out.
   *
   * @param expectation what was expected
   * @param result of the case or variant it is meant for
   * @return both
   */
  static Expected in(Expectation expectation, Result result) {
    return new Expected(
        expectation,
        find(expectation, result),
        result.detail().geometry() == Geometry.AXISYMMETRIC);
  }

  /** Whether it came out within the tolerance; a result that does not exist did not. */
  boolean passed() {
    return computed.isPresent()
        && Math.abs(computed.getAsDouble() - expectation.value()) <= expectation.within();
  }

  private static OptionalDouble find(Expectation expectation, Result result) {
    List<String> subject = expectation.subject();
    String name = subject.get(0);
    return switch (expectation.quantity()) {
      case L2D, L3D -> coupling(subject, result);
      case PSI ->
          result.psi().stream()
              .filter(psi -> psi.name().equals(name))
              .mapToDouble(psi -> psi.valueWPerMK().value())
              .findFirst();
      case CHI ->
          result.chi().stream()
              .filter(chi -> chi.name().equals(name))
              .mapToDouble(chi -> chi.valueWPerK().value())
              .findFirst();
      case U ->
          result.transmittances().stream()
              .filter(u -> u.of().equals(name))
              .mapToDouble(u -> u.valueWPerM2K().value())
              .findFirst();
      case R ->
          result.transmittances().stream()
              .filter(u -> u.of().equals(name))
              .mapToDouble(u -> u.resistanceM2KPerW().value())
              .findFirst();
      case FLOW -> flow(name, result);
      case TEMPERATURE -> temperature(name, result);
      case COLDEST ->
          coldest(name, result).stream().mapToDouble(Result.SurfacePoint::temperatureC).findFirst();
      case F_RSI -> {
        List<Result.SurfacePoint> point = coldest(name, result);
        yield point.isEmpty() ? OptionalDouble.empty() : point.get(0).fRsi();
      }
      case WEIGHT ->
          result.weights().stream()
              .filter(w -> w.point().equals(name) && w.space().equals(subject.get(1)))
              .mapToDouble(Result.Weight::g)
              .findFirst();
    };
  }

  private static OptionalDouble coupling(List<String> subject, Result result) {
    return result.couplings().stream()
        .filter(c -> subject.contains(c.from()) && subject.contains(c.to()))
        .mapToDouble(c -> c.valueWPerMK().value())
        .findFirst();
  }

  private static OptionalDouble flow(String name, Result result) {
    OptionalDouble ofSpace =
        result.spaces().stream()
            .filter(space -> space.name().equals(name))
            .mapToDouble(Result.SpaceResult::heatFlowWPerM)
            .findFirst();
    return ofSpace.isPresent()
        ? ofSpace
        : result.stretches().stream()
            .filter(stretch -> stretch.name().equals(name))
            .mapToDouble(Result.StretchResult::heatFlowWPerM)
            .findFirst();
  }

  private static OptionalDouble temperature(String name, Result result) {
    OptionalDouble atPoint =
        result.points().stream()
            .filter(point -> point.name().equals(name))
            .mapToDouble(Result.PointResult::temperatureC)
            .findFirst();
    return atPoint.isPresent()
        ? atPoint
        : result.spaces().stream()
            .filter(space -> space.name().equals(name) && space.floating())
            .mapToDouble(Result.SpaceResult::temperatureC)
            .findFirst();
  }

  private static List<Result.SurfacePoint> coldest(String name, Result result) {
    return result.spaces().stream()
        .filter(space -> space.name().equals(name))
        .flatMap(space -> space.coldest().stream())
        .toList();
  }

  /** What it is about: {@code temperature A}. */
  String what() {
    String quantity =
        switch (expectation.quantity()) {
          case L2D -> "L2D";
          case L3D -> "L3D";
          case CHI -> "χ";
          case PSI -> "ψ";
          case U -> "U";
          case R -> "R";
          case FLOW -> "flow";
          case TEMPERATURE -> "temperature";
          case COLDEST -> "coldest surface";
          case F_RSI -> "f_Rsi";
          case WEIGHT -> "weight";
        };
    return quantity + " " + String.join(" – ", expectation.subject());
  }

  /** Its unit. */
  String unit() {
    return switch (expectation.quantity()) {
      case L2D, PSI -> "W/(m·K)";
      case L3D, CHI -> "W/K";
      case U -> "W/(m²·K)";
      case R -> "m²·K/W";
      case FLOW -> whole ? "W" : "W/m";
      case TEMPERATURE, COLDEST -> "°C";
      case F_RSI, WEIGHT -> "";
    };
  }
}
