/**
 * A result is everything wanted of one detail, each number with its certificate and everything that
 * was assumed. The entry is {@link coldseam.solver.result.Plan}: what is settled before a detail is
 * solved; with the solutions it makes the {@link coldseam.solver.result.Result}. Not guaranteed:
 * surface temperatures, which are estimates whatever the certificate of the heat flows.
 */
package coldseam.solver.result;
