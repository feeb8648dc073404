package coldseam.cli.sheet;

import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A result as one JSON object. Names carry units; heat flow is positive from a space into the
 * detail; numbers without a finite value are {@code null} and say why.
 */
record JsonResults(Subject subject, Result result) {
  private static final double MM = 1000;

  /** Parts of a millimetre that places are written to: far below what points are told apart by. */
  private static final double PARTS = 1e9;

  String text(boolean indented) {
    Json json = indented ? Json.indented() : Json.onOneLine();
    json.object();
    head(json, subject);
    accuracy(json);
    couplings(json, "coupling", result.couplings(), Counted.of(result));
    psi(json);
    if (!result.chi().isEmpty()) {
      new PointSection(result).write(json);
    }
    transmittances(json);
    frame(json);
    spaces(json);
    stretches(json);
    points(json);
    profiles(json);
    weights(json);
    shares(json);
    flanks(json, result.flanks());
    new CavitySection(result.cavities()).write(json);
    if (!result.framings().isEmpty()) {
      new FramingSection(result, Units.of(subject), Ink.NONE).write(json);
    }
    new FloorEdgeSection(result, Units.of(subject), Ink.NONE).write(json);
    new MoistureSection(result, Units.of(subject), Ink.NONE).write(json);
    new RequiredSection(result, Ink.NONE).write(json);
    assumptions(json, result.assumptions());
    json.member("warnings", result.warnings());
    json.object("balance")
        .member(Counted.of(result).sum(), result.balance().sumWPerM())
        .member("relative", result.balance().relative())
        .endObject();
    json.object("mesh")
        .member("triangles", result.triangles())
        .member("unknowns", result.unknowns())
        .endObject();
    json.object("time_ms");
    for (Map.Entry<String, Double> stage : result.timesMs().entrySet()) {
      json.member(stage.getKey(), Math.round(stage.getValue() * 1000) / 1000.0);
    }
    json.endObject();
    json.member("note", Words.SAFETY);
    return json.endObject().text();
  }

  static void head(Json json, Subject subject) {
    json.member("coldseam", subject.version())
        .member("case", subject.title())
        .member("file", subject.file());
    if (subject.variant().isPresent()) {
      json.member("variant", subject.variant().get());
    } else {
      json.nothing("variant");
    }
  }

  /** The worst of the couplings stands for the solve. */
  private void accuracy(Json json) {
    double halfWidth = 0;
    double relative = 0;
    String reason = "";
    for (Result.Coupling coupling : result.couplings()) {
      Quantity quantity = coupling.valueWPerMK();
      halfWidth = Math.max(halfWidth, quantity.halfWidth());
      relative = Math.max(relative, quantity.halfWidth() / Math.abs(quantity.value()));
      if (reason.isEmpty()) {
        reason = Words.reason(quantity);
      }
    }
    boolean certified = Words.certified(result);
    json.object("accuracy").member("certified", certified);
    String suffix = Counted.of(result).suffix();
    if (certified) {
      json.member("halfWidth_" + suffix, halfWidth).member("relative", relative);
    } else {
      json.nothing("halfWidth_" + suffix)
          .nothing("relative")
          .member("estimatedHalfWidth_" + suffix, halfWidth)
          .member("estimatedRelative", relative)
          .member("reason", reason);
    }
    if (!result.cavities().isEmpty()) {
      json.member("holdsFor", "the conductivities of air cavities as listed");
    }
    json.member("reached", new Reached(subject.accuracy()).by(result))
        .member("largestDisplacement_mm", result.largestDisplacementM() * MM)
        .endObject();
  }

  private static void couplings(
      Json json, String name, List<Result.Coupling> couplings, Counted counted) {
    json.array(name);
    for (Result.Coupling coupling : couplings) {
      json.object()
          .member("between", List.of(coupling.from(), coupling.to()))
          .member("filmSet", Words.name(FilmSet.HEAT_LOSS));
      quantity(json, coupling.valueWPerMK(), counted.suffix());
      tolerance(json, coupling.tolerance(), counted.suffix());
      json.endObject();
    }
    json.endArray();
  }

  /** Value, bounds and what is known of them, names ending in the unit. */
  static void quantity(Json json, Quantity quantity, String unit) {
    json.member("value_" + unit, quantity.value());
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      json.member("lower_" + unit, proved.lower())
          .member("upper_" + unit, proved.upper())
          .member("certified", true);
    } else if (quantity.certificate() instanceof Certificate.NotCertified not) {
      json.nothing("lower_" + unit)
          .nothing("upper_" + unit)
          .member("certified", false)
          .member("estimatedHalfWidth_" + unit, not.estimatedHalfWidth())
          .member("reason", not.reason());
    }
    if (!Double.isFinite(quantity.value())) {
      json.member("note", "the stated problem has no finite answer");
    }
  }

  /** What tolerances of conductivities add; nothing where none is stated. */
  static void tolerance(Json json, Optional<Result.Tolerance> stated, String unit) {
    if (stated.isEmpty()) {
      return;
    }
    Result.Tolerance tolerance = stated.get();
    json.member("toleranceHalfWidth_" + unit, tolerance.halfWidth());
    if (tolerance.certificate() instanceof Certificate.Certified proved) {
      json.member("toleranceLower_" + unit, proved.lower())
          .member("toleranceUpper_" + unit, proved.upper())
          .member("toleranceCertified", true);
    } else if (tolerance.certificate() instanceof Certificate.NotCertified not) {
      json.nothing("toleranceLower_" + unit)
          .nothing("toleranceUpper_" + unit)
          .member("toleranceCertified", false)
          .member("toleranceReason", not.reason());
    }
  }

  private void shares(Json json) {
    json.array("shares");
    for (Result.Share share : result.shares().parts()) {
      json.object().member("of", share.of()).member("film", share.film());
      json.member("share", share.share());
      if (share.relativeTolerance() > 0) {
        json.member("relativeTolerance", share.relativeTolerance());
      }
      json.endObject();
    }
    json.endArray().member("sharesReferTo", result.shares().referTo());
  }

  private void psi(Json json) {
    json.array("psi");
    for (Result.LinearTransmittance psi : result.psi()) {
      json.object()
          .member("name", psi.name())
          .member("of", psi.of())
          .member("between", List.of(Words.spaces(psi.warm()), Words.spaces(psi.cold())))
          .member("dimensions", Words.dimensions(psi))
          .member("filmSet", Words.name(FilmSet.HEAT_LOSS));
      quantity(json, psi.valueWPerMK(), "W_per_mK");
      tolerance(json, psi.tolerance(), "W_per_mK");
      json.object("coupling");
      quantity(json, psi.couplingWPerMK(), "W_per_mK");
      json.endObject();
      json.array("subtracted");
      for (Result.Subtracted term : psi.subtracted()) {
        subtracted(json, term);
      }
      json.endArray();
      if (!psi.parts().isEmpty()) {
        couplings(json, "parts", psi.parts(), Counted.PER_METRE);
      }
      json.array("sensitivities");
      for (Result.Sensitivity sensitivity : psi.sensitivities()) {
        json.object()
            .member("of", sensitivity.of())
            .member("film", sensitivity.film())
            .member("changePer10Percent_W_per_mK", ShareSection.RISE * sensitivity.slope())
            .endObject();
      }
      json.endArray();
      json.endObject();
    }
    json.endArray();
  }

  private static void subtracted(Json json, Result.Subtracted term) {
    json.object().member("name", term.name());
    if (term.uWPerM2K().isPresent()) {
      bracket(json, "U", "W_per_m2K", term.uWPerM2K().get());
    }
    if (term.lengthM().isPresent()) {
      json.member("length_m", term.lengthM().getAsDouble());
    }
    json.member("weight", term.weight());
    bracket(json, "value", "W_per_mK", term.valueWPerMK());
    json.member("derivation", term.derivation()).endObject();
  }

  /** The middle, and both ends where they differ. */
  static void bracket(Json json, String name, String unit, Bracket bracket) {
    json.member(name + "_" + unit, bracket.mid());
    if (bracket.upper() > bracket.lower()) {
      String start = name.equals("value") ? "" : name + "_";
      json.member(start + "lower_" + unit, bracket.lower())
          .member(start + "upper_" + unit, bracket.upper());
    }
  }

  /** One U is an object, several are an array, none is {@code null}: as the case asks for them. */
  private void transmittances(Json json) {
    List<Result.EffectiveTransmittance> all = result.transmittances();
    if (all.isEmpty()) {
      json.nothing("U");
    } else if (all.size() == 1) {
      json.object("U");
      transmittance(json, all.get(0));
    } else {
      json.array("U");
      for (Result.EffectiveTransmittance u : all) {
        json.object();
        transmittance(json, u);
      }
      json.endArray();
    }
  }

  private static void transmittance(Json json, Result.EffectiveTransmittance u) {
    json.member("between", List.of(Words.spaces(u.warm()), Words.spaces(u.cold())))
        .member("of", u.of())
        .member("filmSet", Words.name(FilmSet.HEAT_LOSS));
    quantity(json, u.valueWPerM2K(), "W_per_m2K");
    tolerance(json, u.tolerance(), "W_per_m2K");
    json.member("width_m", u.widthM());
    json.object("R");
    quantity(json, u.resistanceM2KPerW(), "m2K_per_W");
    json.endObject().endObject();
  }

  /** The two runs of a frame and its lengths; nothing where no frame is asked for. */
  private void frame(Json json) {
    if (result.frame().isEmpty()) {
      return;
    }
    Result.Frame frame = result.frame().get();
    json.object("frame")
        .member("width_m", frame.width().valueM())
        .member("innerWidth_m", frame.innerM())
        .member("outerWidth_m", frame.outerM())
        .object("panelRun");
    quantity(json, frame.couplingWPerMK(), "W_per_mK");
    json.array("subtracted");
    for (Result.Subtracted term : frame.panels()) {
      subtracted(json, term);
    }
    json.endArray().endObject();
    if (frame.glazedCouplingWPerMK().isPresent()) {
      json.object("glazedRun");
      quantity(json, frame.glazedCouplingWPerMK().get(), "W_per_mK");
      json.endObject();
    } else {
      json.nothing("glazedRun");
    }
    json.endObject();
  }

  private void spaces(Json json) {
    json.array("spaces");
    for (Result.SpaceResult space : result.spaces()) {
      json.object()
          .member("name", space.name())
          .member("temperature_C", space.temperatureC())
          .member("floats", space.floating())
          .member("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .member(Counted.of(result).heatFlow(), space.heatFlowWPerM());
      if (!Double.isFinite(space.heatFlowWPerM())) {
        json.member("note", "infinite: two fixed temperatures meet");
      }
      if (space.referenceSpace().isPresent()) {
        json.member("fRsiRelativeTo", space.referenceSpace().get());
      }
      surfacePoint(json, "coldest", space.coldest());
      surfacePoint(json, "warmest", space.warmest());
      json.endObject();
    }
    json.endArray();
  }

  private static void surfacePoint(Json json, String name, Optional<Result.SurfacePoint> found) {
    if (found.isEmpty()) {
      json.nothing(name);
      return;
    }
    Result.SurfacePoint point = found.get();
    json.object(name)
        .member("filmSet", Words.name(point.filmSet()))
        .member("temperature_C", point.temperatureC())
        .numbers("at_mm", mm(point.at().x()), mm(point.at().y()))
        .member("Rs_m2K_per_W", point.filmM2KPerW());
    if (point.fRsi().isPresent()) {
      json.member("fRsi", point.fRsi().getAsDouble());
    } else {
      json.nothing("fRsi");
    }
    json.member("certified", false).member("estimatedError_K", point.estimatedErrorK()).endObject();
  }

  /** Millimetres, without the dust of binary fractions. */
  static double mm(double metres) {
    return Math.rint(metres * MM * PARTS) / PARTS;
  }

  private void stretches(Json json) {
    json.array("stretches");
    for (Result.StretchResult stretch : result.stretches()) {
      json.object().member("name", stretch.name());
      if (stretch.space().isEmpty()) {
        json.nothing("space");
      } else {
        json.member("space", stretch.space());
      }
      json.member("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .member(Counted.of(result).heatFlow(), stretch.heatFlowWPerM())
          .member("length_m", stretch.lengthM())
          .endObject();
    }
    json.endArray();
  }

  private void points(Json json) {
    json.array("points");
    for (Result.PointResult point : result.points()) {
      json.object()
          .member("name", point.name())
          .member("filmSet", Words.name(point.filmSet()))
          .numbers("at_mm", mm(point.at().x()), mm(point.at().y()))
          .member("temperature_C", point.temperatureC())
          .endObject();
    }
    json.endArray();
  }

  private void profiles(Json json) {
    json.array("profiles");
    for (Result.ProfileResult profile : result.profiles()) {
      json.object()
          .member("name", profile.name())
          .member("filmSet", Words.name(profile.filmSet()))
          .array("points");
      for (Result.Sample sample : profile.samples()) {
        sample(json, sample);
      }
      json.endArray().endObject();
    }
    json.endArray();
  }

  static void sample(Json json, Result.Sample sample) {
    json.object()
        .member("distance_mm", mm(sample.distanceM()))
        .numbers("at_mm", mm(sample.at().x()), mm(sample.at().y()))
        .member("temperature_C", sample.temperatureC())
        .endObject();
  }

  private void weights(Json json) {
    json.array("weights");
    for (Result.Weight weight : result.weights()) {
      json.object()
          .member("point", weight.point())
          .member("filmSet", Words.name(weight.filmSet()))
          .member("space", weight.space())
          .member("g", weight.g())
          .endObject();
    }
    json.endArray();
  }

  static void flanks(Json json, List<Result.FlankResult> flanks) {
    json.array("flanks");
    for (Result.FlankResult flank : flanks) {
      json.object()
          .member("name", flank.name())
          .member("between", List.of(flank.warm(), flank.cold()));
      bracket(json, "U", "W_per_m2K", flank.uWPerM2K());
      json.member("layers", flank.layers()).object("length_m");
      for (DimensionSystem system : DimensionSystem.values()) {
        Result.Length length = flank.lengthM().get(system);
        if (length != null) {
          json.member(Words.name(system), length.valueM());
        }
      }
      json.endObject().endObject();
    }
    json.endArray();
  }

  static void assumptions(Json json, List<Assumption> assumptions) {
    json.array("assumptions");
    for (Assumption assumption : assumptions) {
      json.object()
          .member("what", assumption.what())
          .member("value", assumption.value())
          .member("source", assumption.source())
          .endObject();
    }
    json.endArray();
  }
}
