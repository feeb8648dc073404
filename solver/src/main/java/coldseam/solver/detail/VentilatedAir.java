package coldseam.solver.detail;

/**
 * Air of a well ventilated layer: part of a space, with films of its own on what it touches (ISO
 * 6946: still air on the construction behind it).
 *
 * @param name unique among the fills of a detail
 * @param space name of the space
 * @param film resistance by the direction of heat flow, in both film sets
 */
public record VentilatedAir(String name, String space, FilmRule film) implements Fill {}
