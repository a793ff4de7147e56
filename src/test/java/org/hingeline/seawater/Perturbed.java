package org.hingeline.seawater;

/** Ω of aragonite from pH and alkalinity with constants moved off by their uncertainties, written out in one piece. */
final class Perturbed {
    static final int CONSTANTS = 5;
    static final int KSP = 3;

    private Perturbed() {}

    /**
     * @param off of K2, KB, KW, Ksp of aragonite and total boron, in standard uncertainties of Orr et al. 2018
     */
    static double omegaAragonite(Conditions conditions, double ph, double totalAlkalinity, double[] off) {
        SeawaterConstants k = SeawaterConstants.of(conditions);
        double k2 = k.k2 * Math.pow(10, 0.015 * off[0]);
        double kb = k.kb * Math.pow(10, 0.01 * off[1]);
        double kw = k.kw * Math.pow(10, 0.01 * off[2]);
        double ksp = k.kspAragonite * Math.pow(10, 0.02 * off[3]);
        double boron = k.boron * (1 + 0.02 * off[4]);
        double h = Math.pow(10, -ph);
        double free = h / (1 + k.sulfate / k.ks);
        double rest =
                boron / (1 + h / kb) + kw / h - free - k.sulfate / (1 + k.ks / free) - k.fluoride / (1 + k.kf / h);
        // bicarbonate + 2 carbonate = carbonate (h/K2 + 2), whatever K1
        double carbonate = (totalAlkalinity - rest) / (h / k2 + 2);
        return carbonate * k.calciumFromSalinity / ksp;
    }
}
