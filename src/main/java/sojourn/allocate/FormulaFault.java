package sojourn.allocate;

/**
 * What is wrong with an expression.
 *
 * @param at the character where, counted from 0
 * @param what what is wrong
 * @param remedy what to do
 */
record FormulaFault(int at, String what, String remedy) {}
