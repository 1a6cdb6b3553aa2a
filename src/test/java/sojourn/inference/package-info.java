/** Tests of standard errors and of what they are made of, against published values, worked cases and closed forms. */
@NullMarked
package sojourn.inference;

import org.jspecify.annotations.NullMarked;
