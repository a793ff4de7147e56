package org.hingeline.seawater;

/**
 * pH of the tris check standard: DelValls, T. A. and Dickson, A. G. (1998), The pH of buffers based on
 * 2-amino-2-hydroxymethyl-1,3-propanediol ('tris') in synthetic sea water, Deep-Sea Research I 45, 1541–1554.
 * Total scale; 0.04 mol/kg-water tris and as much tris hydrochloride in synthetic seawater. The coefficients are quoted
 * from memory and give the checks in the reference data of the tests.
 */
final class DelVallsDickson1998 {
    static final FitRange RANGE = new FitRange("pH of tris by DelValls & Dickson 1998", 20, 40, 0, 45);

    private DelVallsDickson1998() {}

    /** pH, total scale; t in K, s practical salinity of the synthetic seawater. */
    static double ph(double t, double s) {
        return (11911.08 - 18.2499 * s - 0.039336 * s * s) / t
                - 366.27059
                + 0.53993607 * s
                + 0.00016329 * s * s
                + (64.52243 - 0.084041 * s) * Math.log(t)
                - 0.11149858 * t;
    }
}
