/**
 * Floors and the ground by ISO 13370, and the section of a floor's edge with its block of soil by
 * ISO 10211. Start with {@link coldseam.solver.ground.GroundFloor} for the formulas, with {@link
 * coldseam.solver.ground.GroundSection} for the section.
 */
package coldseam.solver.ground;
