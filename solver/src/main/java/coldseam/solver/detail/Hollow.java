package coldseam.solver.detail;

/**
 * Nothing: no heat flows through the area and none through its rim.
 *
 * @param name what the case calls it
 */
public record Hollow(String name) implements Fill {}
