/** Tests of what to hold. */
@NullMarked
package sojourn.allocate;

import org.jspecify.annotations.NullMarked;
