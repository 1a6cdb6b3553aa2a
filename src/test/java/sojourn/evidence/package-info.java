/** Tests of what is asked of regimes, on drawn prices whose truth is known and on real ones. */
@NullMarked
package sojourn.evidence;

import org.jspecify.annotations.NullMarked;
