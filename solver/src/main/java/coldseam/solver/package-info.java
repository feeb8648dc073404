/**
 * Steady heat conduction in two dimensions and the numbers the trade makes of it. The entry is
 * {@link coldseam.solver.Solver}: a detail and an accuracy in, a result out. SI units, temperatures
 * in °C.
 */
package coldseam.solver;
