package coldseam.solver.detail;

/**
 * Something chosen for the user.
 *
 * @param what the thing
 * @param value what was chosen, with its unit
 * @param source the clause it comes from, or "by convention of this tool"
 */
public record Assumption(String what, String value, String source) {}
