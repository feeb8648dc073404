package coldseam.cli.sheet;

/**
 * A picture on a sheet.
 *
 * @param id short and unique
 * @param caption what it shows
 * @param markup the element that shows it
 */
public record Picture(String id, String caption, String markup) {}
