/**
 * A detail is one junction as it is to be solved: areas laid in order, what fills them, the spaces
 * on either side with their films, stretches of outline, flanks, and the results wanted. SI units;
 * temperatures in °C. No file format is known here. The entry is {@link
 * coldseam.solver.detail.Detail}.
 */
package coldseam.solver.detail;
