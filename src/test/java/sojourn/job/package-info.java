/** Tests of the whole job: strategy files and price files in a folder go through the shell, and what it wrote is read back and checked. */
@NullMarked
package sojourn.job;

import org.jspecify.annotations.NullMarked;
