package org.hingeline.seawater;

/**
 * What salinity adds to a pK of pure water in the form of Millero et al. (2006), Marine Chemistry 100, 80–94: A + B/T + C
 * ln T with A = a0 √S + a1 S + a2 S², B = b0 √S + b1 S and C = c0 √S.
 */
record SalinityTerms(double a0, double a1, double a2, double b0, double b1, double c0) {
    /** The terms at t in K, s practical salinity. */
    double at(double t, double s) {
        double root = Math.sqrt(s);
        double a = a0 * root + a1 * s + a2 * s * s;
        double b = b0 * root + b1 * s;
        double c = c0 * root;
        return a + b / t + c * Math.log(t);
    }
}
