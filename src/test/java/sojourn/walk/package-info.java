/** Tests of what was known, and when. */
@NullMarked
package sojourn.walk;

import org.jspecify.annotations.NullMarked;
