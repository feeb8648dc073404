/**
 * The air in a construction carries heat by conduction, convection and radiation at once. This
 * package gives what the trade puts in its place: the equivalent conductivity of a cavity of a
 * frame by ISO 10077-2 ({@link coldseam.solver.cavity.EquivalentConductivity}) and the resistance
 * of an air layer by ISO 6946 ({@link coldseam.solver.cavity.AirLayer}); and the heat that straight
 * grey faces really exchange ({@link coldseam.solver.cavity.Radiosity}). SI units, temperature
 * differences in K. Formulas only: no drawing, no mesh. The values given are conventions of the
 * standards, not bounds of what the air does.
 */
package coldseam.solver.cavity;
