package sojourn.regime;

/**
 * The second best place where starts of a search ended: how much less likely it is, and how many ended there. A small gap means
 * that the window hardly decides between two models.
 *
 * @param gapNats by how much the best log-likelihood is higher; more than 1e-4
 * @param starts how many starts ended within 1e-4 nats of this one, itself included
 */
public record RunnerUp(double gapNats, int starts) {}
