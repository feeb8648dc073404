package coldseam.cases.drawing;

/**
 * Something in a drawing that is no part of the section as read.
 *
 * @param what it is, e.g. "TEXT" or "a script"
 * @param layer its layer, empty if it has none
 * @param why it is left out
 * @param count how many there are
 * @param line where the first stands in the file
 * @param serious whether it may well belong to the section, such as a wall drawn as a proxy
 */
public record LeftOut(String what, String layer, String why, int count, int line, boolean serious) {
  /** In words, e.g. "3 TEXT on layer `NOTES`: words are no outlines (first in line 120)". */
  public String text() {
    return (count == 1 ? "" : count + " × ")
        + what
        + (layer.isEmpty() ? "" : " on layer `" + layer + "`")
        + ": "
        + why
        + (count == 1 ? " (line " : " (first in line ")
        + line
        + ")";
  }
}
