package org.hingeline.dosing;

import java.util.Locale;

/** Numbers in sentences. */
final class Words {
    private Words() {}

    static String number(double value, int decimals) {
        return String.format(Locale.ROOT, "%." + decimals + "f", value);
    }
}
