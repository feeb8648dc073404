package coldseam.cases.study;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * Lines that sweeps have written, read back. A line is one JSON object with {@code "study"}, the
 * key of the study, and {@code "set"}, the settings of its point.
 */
public final class Lines {
  private static final String STUDY = "study";
  private static final String SET = "set";

  private Lines() {}

  /**
   * One line.
   *
   * @param text as it stands, without the line feed
   * @param data the object
   * @param study the key of the study
   * @param settings the settings of the point, numbers as written
   */
  public record Line(
      String text, Map<String, Object> data, String study, Map<String, String> settings) {}

  /**
   * Reads one line.
   *
   * @param text without the line feed
   * @return the line, or empty if it is not whole, or no line of a sweep
   */
  public static Optional<Line> read(String text) {
    if (!text.startsWith("{") || !text.endsWith("}")) {
      return Optional.empty();
    }
    Object read;
    try {
      // JSON is YAML.
      LoadSettings settings = LoadSettings.builder().setCodePointLimit(Integer.MAX_VALUE).build();
      read = new Load(settings).loadFromString(text);
    } catch (YamlEngineException e) {
      return Optional.empty();
    }
    Map<String, Object> data = object(read);
    if (!(data.get(STUDY) instanceof String study) || !(data.get(SET) instanceof Map<?, ?> set)) {
      return Optional.empty();
    }
    Map<String, String> settings = new LinkedHashMap<>();
    for (Map.Entry<?, ?> entry : set.entrySet()) {
      settings.put(entry.getKey().toString(), canonical(entry.getValue().toString()));
    }
    return Optional.of(new Line(text, data, study, settings));
  }

  /**
   * An object of a line.
   *
   * @param read what was read
   * @return its members, none if it is no object
   */
  public static Map<String, Object> object(Object read) {
    Map<String, Object> members = new LinkedHashMap<>();
    if (read instanceof Map<?, ?> map) {
      for (Map.Entry<?, ?> entry : map.entrySet()) {
        members.put(String.valueOf(entry.getKey()), entry.getValue());
      }
    }
    return members;
  }

  /**
   * An array of a line.
   *
   * @param read what was read
   * @return its elements, none if it is no array
   */
  public static List<Object> array(Object read) {
    return read instanceof List<?> list ? new ArrayList<>(list) : List.of();
  }

  /** Settings that mean the same are written the same. */
  private static String canonical(String setting) {
    Optional<BigDecimal> number = Range.number(setting);
    return number.isEmpty() ? setting : Range.plain(number.get());
  }

  /** The settings of a point in the form of those read back. */
  static Map<String, String> canonical(Map<String, String> settings) {
    Map<String, String> same = new LinkedHashMap<>();
    for (Map.Entry<String, String> entry : settings.entrySet()) {
      same.put(entry.getKey(), canonical(entry.getValue()));
    }
    return same;
  }
}
