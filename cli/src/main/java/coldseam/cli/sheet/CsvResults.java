package coldseam.cli.sheet;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import coldseam.solver.result.SpaceMoisture;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A result as comma-separated values: one row a quantity, each figure in the column of its unit.
 * The columns are named as the members of the JSON object. An infinite value is written {@code
 * inf}, one that does not exist is left empty.
 */
final class CsvResults {
  private static final List<String> COLUMNS =
      List.of(
          "file",
          "variant",
          "quantity",
          "name",
          "between",
          "dimensions",
          "filmSet",
          "certified",
          "value_W_per_mK",
          "lower_W_per_mK",
          "upper_W_per_mK",
          "estimatedHalfWidth_W_per_mK",
          "value_W_per_m2K",
          "lower_W_per_m2K",
          "upper_W_per_m2K",
          "estimatedHalfWidth_W_per_m2K",
          "value_m2K_per_W",
          "lower_m2K_per_W",
          "upper_m2K_per_W",
          "estimatedHalfWidth_m2K_per_W",
          "U_W_per_m2K",
          "length_m",
          "heatFlow_W_per_m",
          "temperature_C",
          "estimatedError_K",
          "x_mm",
          "y_mm",
          "distance_mm",
          "Rs_m2K_per_W",
          "fRsi",
          "g",
          "share",
          "changePer10Percent_W_per_mK",
          "toleranceHalfWidth_W_per_mK",
          "toleranceLower_W_per_mK",
          "toleranceUpper_W_per_mK",
          "toleranceHalfWidth_W_per_m2K",
          "toleranceLower_W_per_m2K",
          "toleranceUpper_W_per_m2K",
          "requiredFRsi",
          "margin_K",
          "surfaceHumidity",
          "outdoors_C",
          "dewPoint_C",
          "mouldLimit_C",
          "value_W_per_K",
          "lower_W_per_K",
          "upper_W_per_K",
          "estimatedHalfWidth_W_per_K",
          "area_m2",
          "psi_W_per_mK",
          "heatFlow_W",
          "changePer10Percent_W_per_K",
          "toleranceHalfWidth_W_per_K",
          "toleranceLower_W_per_K",
          "toleranceUpper_W_per_K");

  private final Subject subject;
  private final Result result;
  private final Counted counted;
  private final StringBuilder text = new StringBuilder();

  CsvResults(Subject subject, Result result) {
    this.subject = subject;
    this.result = result;
    counted = Counted.of(result);
  }

  String text() {
    text.append(String.join(",", COLUMNS)).append('\n');
    couplings();
    psi();
    chi();
    transmittances();
    spaces();
    for (Result.StretchResult stretch : result.stretches()) {
      row("stretch", stretch.name())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", stretch.space())
          .number(counted.heatFlow(), stretch.heatFlowWPerM())
          .number("length_m", stretch.lengthM())
          .end();
    }
    for (Result.PointResult point : result.points()) {
      row("point", point.name())
          .word("filmSet", Words.name(point.filmSet()))
          .word("certified", "false")
          .number("temperature_C", point.temperatureC())
          .number("x_mm", JsonResults.mm(point.at().x()))
          .number("y_mm", JsonResults.mm(point.at().y()))
          .end();
    }
    for (Result.ProfileResult profile : result.profiles()) {
      for (Result.Sample sample : profile.samples()) {
        row("profile", profile.name())
            .word("filmSet", Words.name(profile.filmSet()))
            .word("certified", "false")
            .number("temperature_C", sample.temperatureC())
            .number("x_mm", JsonResults.mm(sample.at().x()))
            .number("y_mm", JsonResults.mm(sample.at().y()))
            .number("distance_mm", JsonResults.mm(sample.distanceM()))
            .end();
      }
    }
    floorEdge();
    moisture();
    for (Result.Weight weight : result.weights()) {
      row("weight", weight.point())
          .word("between", weight.space())
          .word("filmSet", Words.name(weight.filmSet()))
          .number("g", weight.g())
          .end();
    }
    for (Result.Share share : result.shares().parts()) {
      row("share", share.of())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", result.shares().referTo())
          .number("share", share.share())
          .end();
    }
    row("balance", "")
        .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
        .number(counted.heatFlow(), result.balance().sumWPerM())
        .end();
    return text.toString();
  }

  private void floorEdge() {
    if (result.floorEdge().isPresent() && result.floorEdge().get().factorWPerMK().isPresent()) {
      Result.FloorEdge edge = result.floorEdge().get();
      row("F-factor", edge.of().surface())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", edge.of().warm() + " – " + edge.of().cold())
          .word("certified", "false")
          .number("value_W_per_mK", edge.factorWPerMK().getAsDouble())
          .number("estimatedHalfWidth_W_per_mK", edge.errorWPerMK())
          .end();
    }
  }

  /** A row a month, then the surface in the month that governs. */
  private void moisture() {
    for (SpaceMoisture space : result.moisture()) {
      for (SpaceMoisture.Month month : space.months()) {
        row("moisture", month.name())
            .word("filmSet", Words.name(FilmSet.SURFACE))
            .word("between", space.space())
            .word("certified", "false")
            .number("temperature_C", month.surfaceC())
            .number("estimatedError_K", month.errorK())
            .number("fRsi", month.fRsi())
            .number("requiredFRsi", month.required(space.atSurface()))
            .number("margin_K", month.marginK(space.atSurface()))
            .number("surfaceHumidity", month.surfaceHumidity())
            .number("outdoors_C", month.outsideC())
            .number("dewPoint_C", month.dewPointC())
            .number("mouldLimit_C", month.mouldC())
            .end();
      }
      if (space.surface().isPresent()) {
        for (Result.Sample sample : space.surface().get().samples()) {
          row("moistureSurface", space.months().get(space.critical().getAsInt()).name())
              .word("filmSet", Words.name(FilmSet.SURFACE))
              .word("between", space.space())
              .word("certified", "false")
              .number("temperature_C", sample.temperatureC())
              .number("x_mm", JsonResults.mm(sample.at().x()))
              .number("y_mm", JsonResults.mm(sample.at().y()))
              .number("distance_mm", JsonResults.mm(sample.distanceM()))
              .end();
        }
      }
    }
  }

  private void couplings() {
    for (Result.Coupling coupling : result.couplings()) {
      row("coupling", "")
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", coupling.from() + " – " + coupling.to())
          .quantity(coupling.valueWPerMK(), counted.suffix())
          .tolerance(coupling.tolerance(), counted.suffix())
          .end();
    }
  }

  private void psi() {
    for (Result.LinearTransmittance psi : result.psi()) {
      row("psi", psi.name())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", Words.between(psi.warm(), psi.cold()))
          .word("dimensions", Words.dimensions(psi))
          .quantity(psi.valueWPerMK(), "W_per_mK")
          .tolerance(psi.tolerance(), "W_per_mK")
          .end();
      for (Result.Subtracted term : psi.subtracted()) {
        Row row =
            row("subtracted", term.name())
                .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
                .word("between", psi.name())
                .number("value_W_per_mK", term.valueWPerMK().mid())
                .number("lower_W_per_mK", term.valueWPerMK().lower())
                .number("upper_W_per_mK", term.valueWPerMK().upper());
        if (term.uWPerM2K().isPresent()) {
          row.number("U_W_per_m2K", term.uWPerM2K().get().mid());
        }
        if (term.lengthM().isPresent()) {
          row.number("length_m", term.lengthM().getAsDouble());
        }
        row.end();
      }
      for (Result.Sensitivity sensitivity : psi.sensitivities()) {
        row("sensitivity", sensitivity.of())
            .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
            .word("between", psi.name())
            .number("changePer10Percent_W_per_mK", ShareSection.RISE * sensitivity.slope())
            .end();
      }
    }
  }

  private void chi() {
    for (Result.PointTransmittance chi : result.chi()) {
      row("chi", chi.name())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", Words.between(chi.warm(), chi.cold()))
          .quantity(chi.valueWPerK(), "W_per_K")
          .tolerance(chi.tolerance(), "W_per_K")
          .end();
      for (Result.PointTerm term : chi.subtracted()) {
        Row row =
            row("subtracted", term.name())
                .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
                .word("between", chi.name())
                .number("value_W_per_K", term.valueWPerK().mid())
                .number("lower_W_per_K", term.valueWPerK().lower())
                .number("upper_W_per_K", term.valueWPerK().upper());
        if (term.areaM2().isPresent()) {
          row.number("U_W_per_m2K", term.uWPerM2K().orElseThrow().mid())
              .number("area_m2", term.areaM2().getAsDouble());
        } else if (term.lengthM().isPresent()) {
          row.number("psi_W_per_mK", term.psiWPerMK().orElseThrow().mid())
              .number("length_m", term.lengthM().getAsDouble());
        }
        row.end();
      }
      for (Result.Sensitivity sensitivity : chi.sensitivities()) {
        row("sensitivity", sensitivity.of())
            .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
            .word("between", chi.name())
            .number("changePer10Percent_W_per_K", ShareSection.RISE * sensitivity.slope())
            .end();
      }
    }
  }

  private void transmittances() {
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      row("U", u.of())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", Words.between(u.warm(), u.cold()))
          .quantity(u.valueWPerM2K(), "W_per_m2K")
          .tolerance(u.tolerance(), "W_per_m2K")
          .number("length_m", u.widthM())
          .end();
      row("R", u.of())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .word("between", Words.between(u.warm(), u.cold()))
          .quantity(u.resistanceM2KPerW(), "m2K_per_W")
          .end();
    }
  }

  private void spaces() {
    for (Result.SpaceResult space : result.spaces()) {
      row("space", space.name())
          .word("filmSet", Words.name(FilmSet.HEAT_LOSS))
          .number("temperature_C", space.temperatureC())
          .number(counted.heatFlow(), space.heatFlowWPerM())
          .end();
      surfacePoint("coldest", space.name(), space.coldest());
      surfacePoint("warmest", space.name(), space.warmest());
    }
  }

  private void surfacePoint(String which, String space, Optional<Result.SurfacePoint> found) {
    if (found.isPresent()) {
      Result.SurfacePoint point = found.get();
      Row row =
          row(which, space)
              .word("filmSet", Words.name(point.filmSet()))
              .word("certified", "false")
              .number("temperature_C", point.temperatureC())
              .number("estimatedError_K", point.estimatedErrorK())
              .number("x_mm", JsonResults.mm(point.at().x()))
              .number("y_mm", JsonResults.mm(point.at().y()))
              .number("Rs_m2K_per_W", point.filmM2KPerW());
      if (point.fRsi().isPresent()) {
        row.number("fRsi", point.fRsi().getAsDouble());
      }
      row.end();
    }
  }

  private Row row(String quantity, String name) {
    return new Row()
        .word("file", subject.file())
        .word("variant", subject.variant().orElse(""))
        .word("quantity", quantity)
        .word("name", name);
  }

  /** One row in the making. */
  private final class Row {
    private final Map<String, String> cells = new LinkedHashMap<>();

    Row word(String column, String value) {
      if (!COLUMNS.contains(column)) {
        throw new IllegalArgumentException("there is no column " + column);
      }
      cells.put(column, quoted(value));
      return this;
    }

    Row number(String column, double value) {
      if (Double.isInfinite(value)) {
        return word(column, value > 0 ? "inf" : "-inf");
      }
      return word(column, Double.isNaN(value) ? "" : Double.toString(value));
    }

    Row quantity(Quantity quantity, String unit) {
      word("certified", Boolean.toString(quantity.certified()));
      number("value_" + unit, quantity.value());
      if (quantity.certificate() instanceof Certificate.Certified proved) {
        return number("lower_" + unit, proved.lower()).number("upper_" + unit, proved.upper());
      }
      return number("estimatedHalfWidth_" + unit, quantity.halfWidth());
    }

    Row tolerance(Optional<Result.Tolerance> stated, String unit) {
      if (stated.isPresent()) {
        number("toleranceHalfWidth_" + unit, stated.get().halfWidth());
        if (stated.get().certificate() instanceof Certificate.Certified proved) {
          number("toleranceLower_" + unit, proved.lower());
          number("toleranceUpper_" + unit, proved.upper());
        }
      }
      return this;
    }

    void end() {
      String comma = "";
      for (String column : COLUMNS) {
        text.append(comma).append(cells.getOrDefault(column, ""));
        comma = ",";
      }
      text.append('\n');
    }
  }

  static String quoted(String value) {
    boolean plain =
        value.indexOf(',') < 0
            && value.indexOf('"') < 0
            && value.indexOf('\n') < 0
            && value.indexOf('\r') < 0;
    return plain ? value : '"' + value.replace("\"", "\"\"") + '"';
  }
}
