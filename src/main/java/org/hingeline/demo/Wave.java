package org.hingeline.demo;

import java.time.Instant;
import java.util.random.RandomGenerator;

/** A sine of absolute time, so that any moment can be asked for and the same moment is always the same. */
record Wave(double amplitude, double periodH, double phase) {

    static Wave of(double amplitude, double periodH, RandomGenerator chance) {
        return new Wave(amplitude, periodH, chance.nextDouble() * 2 * Math.PI);
    }

    double at(Instant time) {
        return amplitude * Math.cos(2 * Math.PI * hours(time) / periodH + phase);
    }

    static double hours(Instant time) {
        return time.getEpochSecond() / 3600.0 + time.getNano() / 3.6e12;
    }
}
