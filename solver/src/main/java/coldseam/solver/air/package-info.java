/**
 * The air drawn in a section: taken apart into cavities, classed by their openings, measured,
 * turned towards the heat flow, and given conductivities that agree with the temperature field. The
 * formulas stand in {@link coldseam.solver.cavity}. Start with {@link
 * coldseam.solver.air.Cavities}.
 */
package coldseam.solver.air;
