/**
 * From a sweep file to a plan of blocks: what is compared, on what, in which order, under which
 * limits and keys. Pure but for reading the files that it is told to read: no process, no clock, no
 * class of a solver or a family.
 *
 * <p>{@link steelyard.harness.sweep.SweepFile} reads a file against a {@link
 * steelyard.harness.sweep.Catalogue} into a {@link steelyard.harness.sweep.Sweep}; {@link
 * steelyard.harness.sweep.Plan} lays that out as blocks; a {@link
 * steelyard.harness.sweep.BlockFile} is one of them, ready to be carried out anywhere.
 */
package steelyard.harness.sweep;
