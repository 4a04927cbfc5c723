/**
 * The only place that starts, limits and ends processes.
 *
 * <p>{@link steelyard.harness.process.Launcher} starts a child in a session of its own, with a pipe
 * as standard input that is its lifeline; {@link steelyard.harness.process.Watch} holds it to its
 * {@link steelyard.harness.process.Limits} and says in an {@link steelyard.harness.process.Exit}
 * how it ended and what it used. Nothing here knows what a child computes.
 *
 * <p>What can go wrong, and what meets it:
 *
 * <ul>
 *   <li>a child that ignores its limit: it is asked through the lifeline, then its whole session is
 *       killed;
 *   <li>descendants that outlive it, or leave its session: found by session, by parent and by the
 *       tag in their environment, and killed;
 *   <li>a harness that is killed: the lifeline closes and the child ends itself; what does not is
 *       ended by the next command through {@link steelyard.harness.process.LiveTable};
 *   <li>a harness or machine that is suspended: the gap between two looks is recorded and the run
 *       counts as disturbed.
 * </ul>
 *
 * <p>A process that leaves the session, loses its parent and clears its environment within one
 * interval between two looks escapes all three marks; only a control group could hold it.
 */
package steelyard.harness.process;
