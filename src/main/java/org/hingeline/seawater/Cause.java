package org.hingeline.seawater;

/**
 * One independent cause of uncertainty, moved by one standard uncertainty: what it does to a water.
 *
 * @param source where it comes from
 * @param constant which constant moves, in the order of {@link Sensitivity}; −1 when none does
 * @param ofConstant by how much, in its logarithm
 * @param temperatureC how far the temperature moves, °C
 * @param salinity how far the salinity moves
 * @param calcium how far the measured calcium moves, mol/kg-seawater
 * @param first how far the first known quantity moves beyond what the others do to it, in its unit
 * @param second the same of the second
 */
record Cause(
        UncertaintySource source,
        int constant,
        double ofConstant,
        double temperatureC,
        double salinity,
        double calcium,
        double first,
        double second) {
    static final int NO_CONSTANT = -1;

    static Cause constant(int constant, double inLogarithm) {
        return new Cause(UncertaintySource.CONSTANTS, constant, inLogarithm, 0, 0, 0, 0, 0);
    }

    static Cause input(
            UncertaintySource source,
            double temperatureC,
            double salinity,
            double calcium,
            double first,
            double second) {
        return new Cause(source, NO_CONSTANT, 0, temperatureC, salinity, calcium, first, second);
    }

    /** Both at once: the same cause, at work in two parts of a water. */
    Cause with(Cause other) {
        return new Cause(
                source,
                constant,
                ofConstant,
                temperatureC + other.temperatureC,
                salinity + other.salinity,
                calcium + other.calcium,
                first + other.first,
                second + other.second);
    }

    /** Whether it moves every water alike: the constants do. */
    boolean common() {
        return constant != NO_CONSTANT;
    }
}
