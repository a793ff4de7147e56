package org.hingeline.dosing;

/**
 * What a balance of the trade can tell apart at a load: 0.01 g below 20 g, 0.1 g below 200 g, 1 g below 5 kg, 10 g above.
 * Masses are counted in such units, so that the additions sum to the whole exactly.
 *
 * @param unitsPerGram how many units make a gram
 */
record Balance(double unitsPerGram) {
    static Balance forLoad(double massG) {
        if (massG < 20) {
            return new Balance(100);
        }
        if (massG < 200) {
            return new Balance(10);
        }
        return massG < 5000 ? new Balance(1) : new Balance(0.1);
    }

    double grams(long units) {
        return units / unitsPerGram;
    }

    long nearest(double massG) {
        return Math.round(massG * unitsPerGram);
    }

    long notAbove(double massG) {
        return (long) Math.floor(massG * unitsPerGram);
    }
}
