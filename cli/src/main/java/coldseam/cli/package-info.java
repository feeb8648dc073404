/**
 * A command takes what was typed, calls one door of the modules below, and puts the answer into
 * words, data and files. The entry is {@link coldseam.cli.Main}; only it ends the process.
 */
package coldseam.cli;
