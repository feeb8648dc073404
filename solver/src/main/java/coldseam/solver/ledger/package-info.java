/**
 * A ledger is a signed account of heat over the boundary of a building in a period: what comes in
 * is positive, what goes out negative, the sum is zero. It is drawn up for a design, where the
 * purchase closes it, or from meters, where what is left over does. Nothing is read or solved here:
 * areas, U, ψ and meters are given, each with its interval. The entry is {@link
 * coldseam.solver.ledger.Ledger}. Not guaranteed: that the sum is right, only that it closes and
 * that the intervals of what it is made of are carried to it.
 */
package coldseam.solver.ledger;
