package org.hingeline.seawater;

/** The step from the °C of the public edge to the kelvin of the equations. */
final class Kelvin {
    static final double ZERO_CELSIUS = 273.15;

    private Kelvin() {}

    static double of(double temperatureC) {
        return temperatureC + ZERO_CELSIUS;
    }
}
