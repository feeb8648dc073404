package coldseam.solver.window;

import coldseam.solver.conduction.Quantity;

/**
 * What fills a pane.
 *
 * @param name unique among the glazings of a window
 * @param opaque whether it is a panel rather than glass
 * @param uWPerM2K U_g, or U_p of a panel, at its middle, W/(m²·K)
 */
public record Infill(String name, boolean opaque, Quantity uWPerM2K) {}
