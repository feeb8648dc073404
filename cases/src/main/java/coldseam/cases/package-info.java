/**
 * A case is one YAML file: one detail, its materials, spaces, drawing and the results wanted. The
 * entry is {@link coldseam.cases.CaseFile}: a path in, a {@link coldseam.cases.Case} or every
 * problem found out. Only here are millimetres, YAML and files known.
 */
package coldseam.cases;
