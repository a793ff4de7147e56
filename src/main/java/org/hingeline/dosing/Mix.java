package org.hingeline.dosing;

/**
 * How much of each product a kilogram of water gets, in mol; their proportion stays the same from the first step to the
 * last.
 *
 * @param first mol of the first product, at least 0
 * @param second mol of the second, at least 0; 0 when there is none
 */
record Mix(double first, double second) {
    /** One product alone. */
    static final Mix OF_FIRST = new Mix(1, 0);

    double of(int product) {
        return product == 0 ? first : second;
    }
}
