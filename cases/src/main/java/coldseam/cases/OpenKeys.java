package coldseam.cases;

import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The keys of one mapping in an {@link OpenFile}; unknown, repeated and empty ones are reported.
 */
public final class OpenKeys {
  private final Pass pass;
  private final Fields fields;

  OpenKeys(Pass pass, Fields fields) {
    this.pass = pass;
    this.fields = fields;
  }

  Fields fields() {
    return fields;
  }

  /** How messages call the mapping. */
  public String what() {
    return fields.what();
  }

  /**
   * Whether a key is there with a value.
   *
   * @param key the key
   * @return whether
   */
  public boolean has(String key) {
    return fields.has(key);
  }

  /**
   * The value of a key.
   *
   * @param key the key
   * @return what stands there, if the key is there
   */
  public Optional<OpenValue> value(String key) {
    return fields.get(key).map(node -> new OpenValue(pass, node));
  }

  /**
   * The value of a key that must be there.
   *
   * @param key the key
   * @param example what would be right
   * @return what stands there; empty if nothing does, which was reported
   */
  public Optional<OpenValue> require(String key, String example) {
    return fields.require(key, example).map(node -> new OpenValue(pass, node));
  }

  /**
   * A number.
   *
   * @param key the key
   * @param place what may stand there
   * @return the number, NaN if a mistake was reported; empty if the key is not there
   */
  public OptionalDouble number(String key, Place place) {
    Optional<OpenValue> value = value(key);
    return value.isEmpty()
        ? OptionalDouble.empty()
        : OptionalDouble.of(value.get().number(called(key), place));
  }

  /**
   * A number that must be there.
   *
   * @param key the key
   * @param place what may stand there
   * @param example what would be right
   * @return the number, NaN if a mistake was reported
   */
  public double number(String key, Place place, String example) {
    Optional<OpenValue> value = require(key, example);
    return value.isEmpty() ? Double.NaN : value.get().number(called(key), place);
  }

  /**
   * One of a few words.
   *
   * @param key the key
   * @param words the words
   * @return the word; empty if the key is not there or a mistake was reported
   */
  public Optional<String> word(String key, List<String> words) {
    return fields.word(key, words);
  }

  /** How messages call what stands under a key. */
  String called(String key) {
    return "`" + key + "` of " + what();
  }

  /**
   * Reports two keys that exclude each other.
   *
   * @param one a key
   * @param other the other
   * @param right what would be right
   * @return whether both are there
   */
  public boolean refuseBoth(String one, String other, String right) {
    return fields.refuseBoth(one, other, right);
  }

  /**
   * Reports a mistake at a key, or at the mapping if the key is not there.
   *
   * @param key the key
   * @param wrong what is wrong
   * @param right what would be right
   */
  public void wrong(String key, String wrong, String right) {
    pass.problems().add(fields.keyNode(key), wrong, right);
  }

  /**
   * Whether the mapping could not be opened, or something near to the key was reported.
   *
   * @param key the key
   * @return whether another word about it would be one too many
   */
  public boolean reported(String key) {
    return fields.reported(key);
  }

  /**
   * What would be right where one of a few words is wanted.
   *
   * @param typed what stands there
   * @param valid the words
   * @return a question if one of them is near, else the list
   */
  public static String suggestion(String typed, Collection<String> valid) {
    return Problems.suggestion(typed, valid);
  }
}
