/**
 * A draft is the case file that a drawing makes by itself: its layers and fills as areas, the open
 * regions around them as spaces, and a mark at everything that a drawing cannot tell. The entry is
 * {@link coldseam.cases.drafting.Draft}. Which side of a drawing is a face and which a cut is
 * guessed from its shape and said so; nothing is guessed of materials or climates.
 */
package coldseam.cases.drafting;
