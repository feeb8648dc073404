/**
 * Results in formats that general-purpose programs read. {@link
 * coldseam.cli.exchange.FieldFile#vtu} writes temperatures and heat flow as a VTK file.
 */
package coldseam.cli.exchange;
