/**
 * What is kept? Tracks, timelines, measures and settings go in; files with exact columns and digests come out. A result folder
 * appears whole or not at all, and a finished one is never overwritten. What the figures mean is left to the packages that
 * compute them. Start with {@link sojourn.archive.ResultFolder} and {@link sojourn.archive.Table}.
 */
@NullMarked
package sojourn.archive;

import org.jspecify.annotations.NullMarked;
