package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Temperatures of surfaces, points and profiles, and weighting factors, as rows of the card. */
record SurfaceSection(Result result, Units units, Ink ink) {
  private static final int MOST_DECIMALS = 2;

  void write(Manuscript text) {
    surfaces(text);
    points(text);
    profiles(text);
    weights(text);
  }

  private void surfaces(Manuscript text) {
    Table table =
        new Table("llrllll", 2, TextCard.PAGE)
            .named("space", "which", "temperature", "factor", "film", "set", "place");
    for (Result.SpaceResult space : result.spaces()) {
      surface(table, space, "coldest", space.coldest());
      surface(table, space, "warmest", space.warmest());
    }
    if (table.isEmpty()) {
      return;
    }
    Set<String> references = new TreeSet<>();
    for (Result.SpaceResult space : result.spaces()) {
      if (space.referenceSpace().isPresent()) {
        references.add(space.referenceSpace().get());
      }
    }
    String factor =
        references.isEmpty() ? "" : "; f_Rsi relative to " + String.join(", ", references);
    text.heading(
        "Surface temperatures",
        "estimates; Rs in m²·K/W, places in " + units.unitInWords() + factor);
    text.table(table);
  }

  private void surface(
      Table table, Result.SpaceResult space, String which, Optional<Result.SurfacePoint> found) {
    if (found.isEmpty()) {
      return;
    }
    Result.SurfacePoint point = found.get();
    String factor = "";
    if (which.equals("coldest") && point.fRsi().isPresent()) {
      factor = ink.strong("f_Rsi " + factor(point, space));
    }
    table.row(
        which.equals("coldest") ? space.name() : "",
        which,
        ink.strong(temperature(point)),
        factor,
        "Rs " + Digits.shortest(point.filmM2KPerW(), 4) + ",",
        Words.name(point.filmSet()) + " films",
        ink.faint("at " + units.place(point.at())));
  }

  private String temperature(Result.SurfacePoint point) {
    String si =
        Digits.of(point.temperatureC(), point.estimatedErrorK(), MOST_DECIMALS).text() + " °C";
    if (!units.customary()) {
      return si;
    }
    Digits.Figure us =
        Digits.of(
            Units.fahrenheit(point.temperatureC()),
            Units.fahrenheitDifference(point.estimatedErrorK()),
            MOST_DECIMALS);
    return si + " = " + us.value() + " °F";
  }

  /** f_Rsi to the digits that the error of the temperature leaves. */
  private String factor(Result.SurfacePoint point, Result.SpaceResult space) {
    double f = point.fRsi().getAsDouble();
    double rise = space.temperatureC() - point.temperatureC();
    double difference = f == 1 ? Double.NaN : rise / (1 - f);
    return Digits.of(f, Math.abs(point.estimatedErrorK() / difference), 3).value();
  }

  private void points(Manuscript text) {
    if (result.points().isEmpty()) {
      return;
    }
    text.heading("Points", "estimates; places in " + units.unitInWords());
    Table table =
        new Table("lrll", 2, TextCard.PAGE).named("point", "temperature", "films", "place");
    for (Result.PointResult point : result.points()) {
      table.row(
          point.name(),
          celsius(point.temperatureC()),
          Words.name(point.filmSet()) + " films",
          ink.faint("at " + units.place(point.at())));
    }
    text.table(table);
  }

  private String celsius(double temperatureC) {
    String si = Digits.fixed(temperatureC, MOST_DECIMALS) + " °C";
    return units.customary()
        ? si + " = " + Digits.fixed(Units.fahrenheit(temperatureC), 1) + " °F"
        : si;
  }

  private void profiles(Manuscript text) {
    if (result.profiles().isEmpty()) {
      return;
    }
    text.heading("Profiles", "estimates; all points are in --json and result.csv");
    Table table =
        new Table("lrll", 2, TextCard.PAGE).named("profile", "samples", "temperature", "films");
    for (Result.ProfileResult profile : result.profiles()) {
      double least = Double.POSITIVE_INFINITY;
      double most = Double.NEGATIVE_INFINITY;
      for (Result.Sample sample : profile.samples()) {
        if (!Double.isNaN(sample.temperatureC())) {
          least = Math.min(least, sample.temperatureC());
          most = Math.max(most, sample.temperatureC());
        }
      }
      table.row(
          profile.name(),
          profile.samples().size() + " points",
          least > most
              ? "outside the section"
              : Digits.fixed(least, 2) + " to " + Digits.fixed(most, 2) + " °C",
          Words.name(profile.filmSet()) + " films");
    }
    text.table(table);
  }

  private void weights(Manuscript text) {
    if (result.weights().isEmpty()) {
      return;
    }
    text.heading("Temperature weighting factors", "θ = Σ g·θ of the spaces (ISO 10211)");
    Table table = new Table("lll", 2, TextCard.PAGE).named("point", "films", "factors g");
    String previous = "";
    FilmSet set = null;
    StringBuilder factors = new StringBuilder();
    for (Result.Weight weight : result.weights()) {
      if (!weight.point().equals(previous) || weight.filmSet() != set) {
        flush(table, previous, set, factors);
        previous = weight.point();
        set = weight.filmSet();
      }
      factors
          .append(factors.length() == 0 ? "" : ", ")
          .append(weight.space())
          .append(' ')
          .append(Digits.fixed(weight.g(), 3));
    }
    flush(table, previous, set, factors);
    text.table(table);
  }

  private void flush(Table table, String point, FilmSet set, StringBuilder factors) {
    if (factors.length() > 0) {
      table.row(point, Words.name(set) + " films", factors.toString());
      factors.setLength(0);
    }
  }
}
