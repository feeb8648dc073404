/**
 * Closing is what makes faces of lines that were drawn by hand: ends and corners that nearly meet
 * are joined within a stated tolerance, then every face that the lines enclose becomes a cell, and
 * what encloses nothing is listed. Lengths in m. The entry is {@link
 * coldseam.mesh.closing.Closing}. Nothing thinner than twice a displacement is ever closed over:
 * what cannot be joined safely is listed as a doubt instead.
 */
package coldseam.mesh.closing;
