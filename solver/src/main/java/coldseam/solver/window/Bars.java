package coldseam.solver.window;

import coldseam.solver.conduction.Quantity;
import java.util.OptionalDouble;

/**
 * Glazing bars of one kind.
 *
 * @param name their name
 * @param psiWPerMK ψ_gb, W/(m·K)
 * @param lengthM their length altogether, m; empty: from the counts
 * @param upright bars that run over the height of every glazed pane
 * @param level bars that run over the width of every glazed pane
 */
public record Bars(
    String name, Quantity psiWPerMK, OptionalDouble lengthM, int upright, int level) {}
