package org.hingeline.dosing;

import java.util.Locale;
import org.hingeline.seawater.CarbonateState;

/** Numbers in sentences. */
final class Words {
    private Words() {}

    static String number(double value, int decimals) {
        return String.format(Locale.ROOT, "%." + decimals + "f", value);
    }

    /** "12.4 g", "1.39 kg". */
    static String mass(double grams) {
        return grams >= 1000 ? number(grams / 1000, 2) + " kg" : number(grams, grams < 10 ? 2 : 1) + " g";
    }

    /** "1.32", "97", "159": to state a ceiling, cut off and never rounded up. */
    static String notAbove(double value) {
        int decimals = value < 10 ? 2 : 0;
        double scale = Math.pow(10, decimals);
        return number(Math.floor(value * scale) / scale, decimals);
    }

    /** "12.4 L": rounded up, since it must do. */
    static String litresAtLeast(double litres) {
        int decimals = litres < 100 ? 1 : 0;
        double scale = Math.pow(10, decimals);
        return number(Math.ceil(litres * scale) / scale, decimals) + " L";
    }

    /** "Ω aragonite 3.00, pH 8.05". */
    static String water(CarbonateState state) {
        return "Ω aragonite " + number(state.omegaAragonite(), 2) + ", pH " + number(state.phTotal(), 2);
    }
}
