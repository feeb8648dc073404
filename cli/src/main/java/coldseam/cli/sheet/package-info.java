/**
 * A sheet is a result made readable: the numbers first, each with what is known of its error, then
 * flows, surfaces, points, everything assumed, warnings. The entry is {@link
 * coldseam.cli.sheet.Sheet}: as a card for the terminal, as JSON, as CSV.
 */
package coldseam.cli.sheet;
