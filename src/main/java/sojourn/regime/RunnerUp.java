package sojourn.regime;

/**
 * The second best place where starts of a search ended: how much worse it is, and how many ended there. A small gap means that the
 * window hardly decides between two models.
 *
 * @param gap by how much the best is better, above 0: nats of log-likelihood (with a prior, of its log density besides), more than 1e-4; of a jump model squared deviations,
 *     by which its objective is lower
 * @param starts how many starts agree with this one, itself included
 */
public record RunnerUp(double gap, int starts) {}
