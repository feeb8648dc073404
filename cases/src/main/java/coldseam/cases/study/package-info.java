/**
 * Studies: many solves of one case with something changed in it.
 *
 * <p>A {@link coldseam.cases.study.Sweep} varies one or two named values or fills over {@link
 * coldseam.cases.study.Axis axes}; its {@link coldseam.cases.study.Point points} are independent
 * jobs. {@link coldseam.cases.study.Study} runs them on all processors and {@link
 * coldseam.cases.study.LineFile} keeps one line for each, so that what was interrupted goes on and
 * the parts of a {@link coldseam.cases.study.Shard} merge by concatenation. A {@link
 * coldseam.cases.study.Seek} finds the value that just meets a target, decided by intervals. {@link
 * coldseam.cases.study.Measure} is a number of a result as studies compare it.
 */
package coldseam.cases.study;
