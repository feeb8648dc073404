/**
 * A page in the browser that follows a case while it is being written. {@link
 * coldseam.cli.live.LivePage} serves it to this machine alone; a {@link coldseam.cli.live.Scene} is
 * what it shows.
 */
package coldseam.cli.live;
