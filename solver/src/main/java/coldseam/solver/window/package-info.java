/**
 * A window is a rectangle of frame profiles, mullions and transoms with a glazing or a panel in
 * every pane; its U_w is that of ISO 10077-1, with the intervals of what it is made of carried to
 * the sum. SI units. The entry is {@link coldseam.solver.window.Window}. The figures of profiles
 * and glazings are given here, wherever they come from: nothing is solved.
 */
package coldseam.solver.window;
