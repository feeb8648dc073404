/**
 * Text is what leaves the program by way of a terminal or a pipe: numbers with no more digits than
 * are known, aligned tables, colour where it is welcome, JSON. Nothing of heat is known here. The
 * entries are {@link coldseam.cli.text.Digits}, {@link coldseam.cli.text.Table}, {@link
 * coldseam.cli.text.Ink} and {@link coldseam.cli.text.Json}.
 */
package coldseam.cli.text;
