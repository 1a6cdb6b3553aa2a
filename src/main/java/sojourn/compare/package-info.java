/**
 * The whole job, over many variants: strategies go in; each is walked forward, traded and judged over one window; a comparison
 * comes out, with a row for everything that ran and for everything that failed. How it is shown is left to others. Start with
 * {@link sojourn.compare.Comparison}.
 */
@NullMarked
package sojourn.compare;

import org.jspecify.annotations.NullMarked;
