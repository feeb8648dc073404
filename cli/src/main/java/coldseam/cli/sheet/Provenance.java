package coldseam.cli.sheet;

import coldseam.cases.TitleBlock;
import java.util.List;

/**
 * Where a sheet comes from.
 *
 * @param block what is typed in the case
 * @param fileDate the day the case file was last changed, as {@code 2026-11-30}
 * @param sources the files that the case was read from, itself first
 */
public record Provenance(TitleBlock block, String fileDate, List<Source> sources) {
  /**
   * A file.
   *
   * @param file as the reader would name it
   * @param sha256 the hash of its content, hexadecimal
   */
  public record Source(String file, String sha256) {}
}
