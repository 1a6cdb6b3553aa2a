/** Tests of workers and of yardsticks' policies. */
@NullMarked
package sojourn.compare;

import org.jspecify.annotations.NullMarked;
