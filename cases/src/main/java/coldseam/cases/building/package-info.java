/**
 * A building file lists the envelope of a building with its junctions, the climate of a period,
 * gains and what is bought; it becomes a {@link coldseam.solver.ledger.Ledger} once the cases that
 * it takes ψ from are solved. The entry is {@link coldseam.cases.building.BuildingFile}. The format
 * is described in {@code cases/README.md} and {@code building.schema.json}.
 */
package coldseam.cases.building;
