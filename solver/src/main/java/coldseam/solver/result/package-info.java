/**
 * A result is everything wanted of one detail, each number with its certificate and everything that
 * was assumed. The entry is {@link coldseam.solver.result.Result}.
 */
package coldseam.solver.result;
