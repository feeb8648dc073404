/**
 * A plot is one sheet that shows a solved detail: the section with its materials and dimensions,
 * the temperatures, or the heat flow. Each is drawn once with Java2D and written as SVG or PNG.
 * Inside, lengths of the drawing are metres, local to the origin of the partition; lengths on the
 * sheet are points of 1/96 in, y downwards. The entry is {@link coldseam.cli.plot.Plots}. Not
 * guaranteed: that a plot can be measured; the numbers are in the results.
 */
package coldseam.cli.plot;
