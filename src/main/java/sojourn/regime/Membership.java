package sojourn.regime;

/** How much each row of a window belongs to each state: one weight a row and state, a row's weights sum to 1. */
interface Membership {
    /** Number of rows. */
    int size();

    /** Number of states. */
    int states();

    /** Weight of state {@code k} in that row. */
    double at(int row, int k);
}
