package org.hingeline.web;

import org.hingeline.measure.MassUnit;
import org.hingeline.measure.VolumeUnit;

/**
 * Amounts of a dose as a person weighs and measures them: in grams or kilograms always, in pounds beside for those whose
 * tank is in US gallons.
 *
 * @param volumeUnit the unit the person gave the tank in
 */
record DoseAmounts(VolumeUnit volumeUnit) {
    private static final String NO_BREAK_SPACE = "\u00a0";

    private static final double KILOGRAMS_FROM_G = 10_000;

    /** "160 g", "12.40 kg", "160 g (0.353 lb)". */
    String mass(double grams) {
        String metric = grams >= KILOGRAMS_FROM_G
                ? with(Words.number(MassUnit.KILOGRAM.fromGrams(grams), 2), MassUnit.KILOGRAM.label())
                : with(Words.number(grams, grams < 10 ? 2 : grams < 100 ? 1 : 0), MassUnit.GRAM.label());
        if (volumeUnit != VolumeUnit.US_GALLON) {
            return metric;
        }
        double pounds = MassUnit.POUND.fromGrams(grams);
        return metric + " (" + with(Words.number(pounds, pounds < 1 ? 3 : 2), MassUnit.POUND.label()) + ")";
    }

    /** "4 000 L", "1 057 US gal (4 000 L)": litres always, since what follows was worked out in them. */
    String volume(double litres) {
        String metric = with(Words.number(litres, litres < 100 ? 1 : 0), VolumeUnit.LITRE.label());
        if (volumeUnit == VolumeUnit.LITRE) {
            return metric;
        }
        double volume = volumeUnit.fromLitres(litres);
        return with(Words.number(volume, volume < 100 ? 2 : 0), volumeUnit.label()) + " (" + metric + ")";
    }

    private static String with(String number, String label) {
        return number + NO_BREAK_SPACE + label.replace(" ", NO_BREAK_SPACE);
    }
}
