/**
 * Symmetric positive definite sparse systems: assembled, put in a fill-reducing order, factored
 * once, solved many times. The only package that knows the algebra library.
 */
package coldseam.solver.algebra;
