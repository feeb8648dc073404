package coldseam.cli.sheet;

import coldseam.mesh.plane.Point;
import coldseam.solver.air.Cavity;
import coldseam.solver.cavity.CavityBox;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.View;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;

/** Results made by hand, so that what is written can be compared with what stands in them. */
final class Samples {
  private Samples() {}

  static Subject subject() {
    return new Subject(
        "Slab edge", "cases/slab.yaml", Optional.empty(), "mm", 0.001, Accuracy.STANDARD, "0.1.0");
  }

  static Subject inches() {
    return new Subject(
        "Stud wall",
        "cases/stud.yaml",
        Optional.of("steel, \"light\""),
        "in",
        0.0254,
        Accuracy.STANDARD,
        "0.1.0");
  }

  static Quantity estimate(double value, double halfWidth) {
    return new Quantity(value, new Certificate.NotCertified("no bounds are computed", halfWidth));
  }

  static Quantity proved(double value, double lower, double upper) {
    return new Quantity(value, new Certificate.Certified(lower, upper));
  }

  /** Two spaces, everything estimated. */
  static Result estimated() {
    return result(
        estimate(1.23456, 0.0004),
        estimate(0.61234, 0.00042),
        estimate(0.2134, 1e-4),
        estimate(4.686036, 0.003));
  }

  /** The same with bounds. */
  static Result certified() {
    return bounded(proved(4.686036, 4.6838, 4.6883));
  }

  /** The same with bounds but for R. */
  static Result mixed() {
    return bounded(estimate(4.686036, 0.003));
  }

  private static Result bounded(Quantity resistance) {
    return result(
        proved(1.23456, 1.2342, 1.2349),
        proved(0.61234, 0.6119, 0.6128),
        proved(0.2134, 0.2133, 0.2135),
        resistance);
  }

  /** Two fixed temperatures meet: no finite coupling, temperatures only. */
  static Result infinite() {
    Quantity none =
        new Quantity(
            Double.POSITIVE_INFINITY,
            new Certificate.NotCertified(
                "two fixed temperatures meet in a point", Double.POSITIVE_INFINITY));
    return result(none, estimate(0.6, 0.0001), estimate(0.2, 0.0001), estimate(5, 0.0025));
  }

  private static Result result(Quantity coupling, Quantity psi, Quantity u, Quantity resistance) {
    Detail detail =
        new Detail(
            "Slab edge",
            Geometry.PLANE,
            View.UPRIGHT,
            List.of(),
            List.of(
                Space.of("indoors", 20, Exposure.INSIDE),
                Space.of("outdoors", -5, Exposure.OUTSIDE)),
            List.of(),
            List.of(),
            List.of(),
            List.of());
    return new Result(
        detail,
        List.of(
            new Result.Coupling("indoors", "outdoors", coupling, tolerance(coupling, resistance))),
        List.of(
            new Result.LinearTransmittance(
                "external",
                "floor edge",
                List.of("indoors"),
                List.of("outdoors"),
                Optional.of(DimensionSystem.EXTERNAL),
                coupling,
                psi,
                List.of(
                    new Result.Subtracted(
                        "wall above",
                        Optional.of(Bracket.of(0.2)),
                        OptionalDouble.of(1.5),
                        1,
                        Bracket.of(0.3),
                        "layers at the cut-off plane, outer face"),
                    new Result.Subtracted(
                        "floor",
                        Optional.of(new Bracket(0.3199, 0.3201)),
                        OptionalDouble.of(1),
                        0.5,
                        new Bracket(0.15995, 0.16005),
                        "")),
                List.of(),
                List.of(
                    new Result.Sensitivity("insulation", false, 0.01234),
                    new Result.Sensitivity("film indoors 0.13", true, -0.002)),
                tolerance(psi, resistance))),
        List.of(
            new Result.EffectiveTransmittance(
                "wall",
                List.of("indoors"),
                List.of("outdoors"),
                u,
                resistance,
                0.6,
                tolerance(u, resistance))),
        List.of(),
        Optional.empty(),
        List.of(
            space("indoors", 20, coupling.value() * 25),
            space("outdoors", -5, -coupling.value() * 25)),
        List.of(new Result.StretchResult("slab edge", "outdoors", -3.25, 0.4)),
        List.of(new Result.PointResult("A", FilmSet.HEAT_LOSS, new Point(0.1234, -0.5), 11.23456)),
        List.of(
            new Result.ProfileResult(
                "along the wall",
                FilmSet.SURFACE,
                List.of(
                    new Result.Sample(0, new Point(0, 0), 12.5),
                    new Result.Sample(0.5, new Point(0, 0.5), Double.NaN)))),
        Double.isFinite(coupling.value())
            ? new Result.Shares(
                "L2D indoors – outdoors",
                List.of(
                    new Result.Share("insulation", "", 0.8, 0.03),
                    new Result.Share("film indoors 0.13", "indoors", 0.1996, 0),
                    new Result.Share("foil", "", 0.0004, 0)))
            : new Result.Shares("", List.of()),
        List.of(
            new Result.Weight("A", FilmSet.HEAT_LOSS, "indoors", 0.65),
            new Result.Weight("A", FilmSet.HEAT_LOSS, "outdoors", 0.35)),
        List.of(
            new Result.FlankResult(
                "wall above",
                Bracket.of(0.2),
                "indoors",
                "outdoors",
                Optional.of(new Point(0, 1.5)),
                Optional.of(new Point(0.4, 1.5)),
                List.of("brick 240", "insulation 160"),
                Map.of(
                    DimensionSystem.EXTERNAL,
                    new Result.Length(1.5, Optional.empty(), Optional.empty(), "outer face")))),
        List.of(
            new Cavity(
                "cavity 1",
                "air",
                new Point(0.045, 0.0421),
                324e-6,
                AirCavity.Rule.FRAME,
                Ventilation.SLIGHTLY_VENTILATED,
                0.005,
                Optional.of("outdoors"),
                Optional.of(
                    new Cavity.Counted(
                        new CavityBox(0.054, 0.006),
                        new Point(0, -1),
                        new Emissivities(0.9, 0.25),
                        0.205031,
                        Optional.of(RadiationForm.PRODUCT.words()),
                        AirCavity.Temperatures.FOUND,
                        false,
                        OptionalDouble.of(7.5),
                        OptionalDouble.of(9.25),
                        5,
                        true))),
            new Cavity(
                "cavity 2",
                "air",
                new Point(0.5, 0.5),
                0.01,
                AirCavity.Rule.LAYER,
                Ventilation.WELL_VENTILATED,
                0.02,
                Optional.of("outdoors"),
                Optional.empty())),
        List.of(),
        Optional.empty(),
        List.of(),
        List.of(),
        List.of(
            new Assumption("film of indoors, walls", "0.13 m²·K/W", "ISO 6946, Rsi horizontal")),
        List.of("the cut-off plane at the top is 0.8 m from the slab, less than 1 m"),
        new Result.Balance(2e-13, 7e-15),
        2e-9,
        null,
        Optional.empty(),
        1234,
        5678,
        new TreeMap<>(Map.of("mesh", 12.5, "solve", 80.25)));
  }

  /** A quarter of a proved number; proved itself where R is. */
  private static Optional<Result.Tolerance> tolerance(Quantity quantity, Quantity resistance) {
    if (!quantity.certified()) {
      return Optional.empty();
    }
    double width = quantity.value() / 4;
    return Optional.of(
        new Result.Tolerance(
            width - quantity.halfWidth(),
            resistance.certified()
                ? new Certificate.Certified(quantity.value() - width, quantity.value() + width)
                : new Certificate.NotCertified("more than two spaces take part", width)));
  }

  private static Result.SpaceResult space(String name, double temperatureC, double flow) {
    Result.SurfacePoint coldest =
        new Result.SurfacePoint(
            FilmSet.SURFACE, 13.1234, new Point(0, -0.2), 0.25, OptionalDouble.of(0.724936), 0.004);
    Result.SurfacePoint warmest =
        new Result.SurfacePoint(
            FilmSet.SURFACE, 19.2, new Point(0, 1.2), 0.25, OptionalDouble.of(0.968), 0.004);
    boolean inside = temperatureC > 0;
    return new Result.SpaceResult(
        name,
        temperatureC,
        false,
        flow,
        inside ? Optional.of(coldest) : Optional.empty(),
        inside ? Optional.of(warmest) : Optional.empty(),
        inside ? Optional.of("outdoors") : Optional.empty());
  }
}
