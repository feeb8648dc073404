package coldseam.cases;

import coldseam.cases.words.Invisible;
import java.util.Optional;

/**
 * One mistake in a file.
 *
 * @param file the file as the user named it
 * @param line line from 1, 0 if the whole file is meant
 * @param column column from 1, 0 if the whole line is meant
 * @param wrong what is wrong, a sentence without a full stop
 * @param right what would be right, a sentence without a full stop
 */
public record Problem(String file, int line, int column, String wrong, Optional<String> right) {
  /** Whatever a file says is shown without what a terminal would act on. */
  public Problem {
    wrong = Invisible.shown(wrong);
    if (right.isPresent()) {
      right = Optional.of(Invisible.shown(right.get()));
    }
  }

  /** The problem in one line: {@code file:line:column: what is wrong; what would be right}. */
  public String text() {
    StringBuilder text = new StringBuilder(file);
    if (line > 0) {
      text.append(':').append(line);
      if (column > 0) {
        text.append(':').append(column);
      }
    }
    text.append(": ").append(wrong);
    right.ifPresent(r -> text.append("; ").append(r));
    return text.toString();
  }
}
