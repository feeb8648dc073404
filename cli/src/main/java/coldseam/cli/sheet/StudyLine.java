package coldseam.cli.sheet;

import coldseam.cases.study.Lines;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Kind;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cases.study.Point;
import coldseam.cli.text.Json;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Geometry;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The line of one point of a sweep: one JSON object, the names in it as in the result of a case,
 * and what of it is read back.
 */
public final class StudyLine {
  private StudyLine() {}

  /**
   * Writes a line.
   *
   * @param key of the study
   * @param point what was set
   * @param subject what was asked
   * @param result what came out
   * @return one line without line feed
   */
  public static String write(String key, Point point, Subject subject, Result result) {
    Json json = Json.onOneLine().object().member("coldseam", subject.version());
    json.member("study", key).member("case", subject.title()).member("file", subject.file());
    if (subject.variant().isPresent()) {
      json.member("variant", subject.variant().get());
    } else {
      json.nothing("variant");
    }
    settings(json, point.settings());
    json.member("accuracyReached", Sheet.accurateEnough(subject, result));
    json.array("psi");
    for (Result.LinearTransmittance psi : result.psi()) {
      json.object().member("name", psi.name()).member("dimensions", Words.dimensions(psi));
      JsonResults.quantity(json, psi.valueWPerMK(), Kind.PSI.unitInNames());
      json.endObject();
    }
    json.endArray().array("chi");
    for (Result.PointTransmittance chi : result.chi()) {
      json.object().member("name", chi.name());
      JsonResults.quantity(json, chi.valueWPerK(), Kind.CHI.unitInNames());
      json.endObject();
    }
    json.endArray().array("U");
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      json.object().member("of", u.of());
      JsonResults.quantity(json, u.valueWPerM2K(), Kind.U.unitInNames());
      json.endObject();
    }
    boolean round = result.detail().geometry() == Geometry.AXISYMMETRIC;
    Kind couplings = round ? Kind.L3D : Kind.L2D;
    json.endArray().array("coupling");
    for (Result.Coupling coupling : result.couplings()) {
      json.object().member("between", List.of(coupling.from(), coupling.to()));
      JsonResults.quantity(json, coupling.valueWPerMK(), couplings.unitInNames());
      json.endObject();
    }
    json.endArray().array("spaces");
    for (Measure measure : Measure.all(result)) {
      if (measure.kind() == Kind.COLDEST) {
        coldest(json, measure);
      } else if (measure.kind() == Kind.F_RSI) {
        json.member("fRsi", measure.value())
            .member("fRsiMargin", measure.value() - measure.lower())
            .endObject()
            .endObject();
      }
    }
    json.endArray();
    json.object("mesh").member("unknowns", result.unknowns()).endObject();
    double time = 0;
    for (double stage : result.timesMs().values()) {
      time += stage;
    }
    return json.member("time_ms", Math.rint(10 * time) / 10).endObject().text();
  }

  private static void coldest(Json json, Measure measure) {
    json.object()
        .member("name", measure.of())
        .object("coldest")
        .member("filmSet", Words.name(FilmSet.SURFACE))
        .member("certified", false)
        .member("temperature_C", measure.value())
        .member("margin_K", measure.value() - measure.lower());
  }

  /** Settings, plain numbers as numbers. */
  static void settings(Json json, Map<String, String> settings) {
    json.object("set");
    for (Map.Entry<String, String> setting : settings.entrySet()) {
      if (plainNumber(setting.getValue())) {
        json.member(setting.getKey(), Double.parseDouble(setting.getValue()));
      } else {
        json.member(setting.getKey(), setting.getValue());
      }
    }
    json.endObject();
  }

  private static boolean plainNumber(String text) {
    boolean digit = false;
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      digit |= c >= '0' && c <= '9';
      if (!(c >= '0' && c <= '9') && c != '.' && !(c == '-' && i == 0)) {
        return false;
      }
    }
    return digit && text.indexOf('.') == text.lastIndexOf('.');
  }

  /**
   * The numbers of a line.
   *
   * @param line the line
   * @return the numbers, in the order of {@link Measure#all}
   */
  public static List<Measure> measures(Lines.Line line) {
    List<Measure> measures = new ArrayList<>();
    for (Object psi : Lines.array(line.data().get("psi"))) {
      add(measures, Kind.PSI, String.valueOf(Lines.object(psi).get("name")), psi);
    }
    for (Object chi : Lines.array(line.data().get("chi"))) {
      add(measures, Kind.CHI, String.valueOf(Lines.object(chi).get("name")), chi);
    }
    for (Object u : Lines.array(line.data().get("U"))) {
      add(measures, Kind.U, String.valueOf(Lines.object(u).get("of")), u);
    }
    for (Object coupling : Lines.array(line.data().get("coupling"))) {
      List<String> names = new ArrayList<>();
      for (Object name : Lines.array(Lines.object(coupling).get("between"))) {
        names.add(String.valueOf(name));
      }
      boolean round = Lines.object(coupling).containsKey("value_" + Kind.L3D.unitInNames());
      add(measures, round ? Kind.L3D : Kind.L2D, String.join(" – ", names), coupling);
    }
    for (Object read : Lines.array(line.data().get("spaces"))) {
      Map<String, Object> space = Lines.object(read);
      Map<String, Object> coldest = Lines.object(space.get("coldest"));
      String name = String.valueOf(space.get("name"));
      estimate(measures, Kind.COLDEST, name, coldest, "temperature_C", "margin_K");
      estimate(measures, Kind.F_RSI, name, coldest, "fRsi", "fRsiMargin");
    }
    return measures;
  }

  private static void add(List<Measure> into, Kind kind, String of, Object read) {
    Map<String, Object> data = Lines.object(read);
    double value = number(data.get("value_" + kind.unitInNames()));
    double lower = number(data.get("lower_" + kind.unitInNames()));
    double upper = number(data.get("upper_" + kind.unitInNames()));
    if (Double.isNaN(value)) {
      return;
    }
    if (Double.isNaN(lower) || Double.isNaN(upper)) {
      into.add(
          new Measure(
              kind, of, value, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, Knowledge.OPEN));
    } else {
      into.add(new Measure(kind, of, value, lower, upper, Knowledge.CERTIFIED));
    }
  }

  private static void estimate(
      List<Measure> into,
      Kind kind,
      String of,
      Map<String, Object> data,
      String valueName,
      String marginName) {
    double value = number(data.get(valueName));
    double margin = number(data.get(marginName));
    if (!Double.isNaN(value) && !Double.isNaN(margin)) {
      into.add(new Measure(kind, of, value, value - margin, value + margin, Knowledge.ESTIMATE));
    }
  }

  private static double number(Object read) {
    return read instanceof Number number ? number.doubleValue() : Double.NaN;
  }

  /** Whether the half-widths asked for were reached at a point. */
  public static boolean accurateEnough(Lines.Line line) {
    return Boolean.TRUE.equals(line.data().get("accuracyReached"));
  }
}
