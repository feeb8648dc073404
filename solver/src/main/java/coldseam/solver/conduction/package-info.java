/**
 * Conduction: div(λ grad θ) = 0 in each material, heat flow (θ − θ_space)/Rs on surfaces with a
 * film, none across cut-off planes. Solved with quadratic conforming elements on an adaptively
 * refined mesh. The entry is {@link coldseam.solver.conduction.Conduction}.
 */
package coldseam.solver.conduction;
