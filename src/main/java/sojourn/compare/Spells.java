package sojourn.compare;

import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.RandomStream;

/**
 * A run of states 0 and 1 as spells that take turns. The first and the last spell are cut off by the ends and keep their places;
 * between them, spells of each state are put in a random order of their own, every order as likely (Fisher and Yates, 1938), and take
 * turns as before. So as much time is spent in each state, in as many spells of the same lengths.
 */
final class Spells {
    private final int firstState;
    private final int[] lengths;

    private Spells(int firstState, int[] lengths) {
        this.firstState = firstState;
        this.lengths = lengths;
    }

    /** Of {@code states}, at least one. Not modified. */
    static Spells of(int[] states) {
        List<Integer> lengths = new ArrayList<>();
        int length = 0;
        for (int i = 0; i < states.length; i++) {
            length++;
            if (i + 1 == states.length || states[i + 1] != states[i]) {
                lengths.add(length);
                length = 0;
            }
        }
        return new Spells(
                states[0], lengths.stream().mapToInt(Integer::intValue).toArray());
    }

    /** How many spells of a state are complete. */
    int complete(int state) {
        int count = 0;
        for (int i = 1; i < lengths.length - 1; i++) {
            count += state(i) == state ? 1 : 0;
        }
        return count;
    }

    /** Whether there is more than one order. */
    boolean canBeShuffled() {
        return complete(0) > 1 || complete(1) > 1;
    }

    /** The states in a random order of complete spells. */
    int[] shuffled(RandomStream random) {
        int[] order = lengths.clone();
        for (int parity = 1; parity <= 2; parity++) {
            int complete = complete(state(parity));
            for (int i = complete - 1; i > 0; i--) {
                int other = random.nextInt(i + 1);
                int here = parity + 2 * i;
                int there = parity + 2 * other;
                int kept = order[here];
                order[here] = order[there];
                order[there] = kept;
            }
        }
        return states(order);
    }

    private int state(int spell) {
        return spell % 2 == 0 ? firstState : 1 - firstState;
    }

    private int[] states(int[] order) {
        int size = 0;
        for (int length : order) {
            size += length;
        }
        int[] states = new int[size];
        int next = 0;
        for (int spell = 0; spell < order.length; spell++) {
            for (int i = 0; i < order[spell]; i++) {
                states[next++] = state(spell);
            }
        }
        return states;
    }
}
