/**
 * The library is a list of materials in the trade's generic names, each figure with its source and
 * how far that is confirmed. The entry is {@link coldseam.cases.library.Library}.
 */
package coldseam.cases.library;
