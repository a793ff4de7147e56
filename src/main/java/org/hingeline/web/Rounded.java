package org.hingeline.web;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * A number with as many digits as its standard uncertainty leaves worth reading: to the uncertainty's first figure, or its
 * second where the first is 1 or 2.
 */
record Rounded(String value, String plusMinus) {
    private static final double NOTHING = 1e-9;
    private static final int MOST_DIGITS = 6;
    private static final MathContext AS_TYPED = new MathContext(7);

    /** @param uncertainty where it is nothing beside the value, the value is exact and gets {@code digits} decimals */
    static Rounded of(double value, double uncertainty, int digits) {
        if (!(uncertainty > NOTHING * Math.abs(value))) {
            return new Rounded(Words.number(value, digits), "");
        }
        int worth = worth(uncertainty);
        return new Rounded(Words.number(value, worth), Words.number(uncertainty, worth));
    }

    private static int worth(double uncertainty) {
        double figures = uncertainty / Math.pow(10, Math.floor(Math.log10(uncertainty)));
        return figures < 2.95 ? digits(uncertainty) : Math.max(0, digits(uncertainty) - 1);
    }

    /** A small number alone, to two figures. */
    static String small(double value) {
        return value > 0 ? Words.number(value, digits(value)) : "0";
    }

    private static int digits(double value) {
        int digits = 1 - (int) Math.floor(Math.log10(value));
        return Math.min(MOST_DIGITS, Math.max(0, digits));
    }

    /** As a person would type it: seven figures at most, no thousands, no padding, no powers of ten. */
    static String typed(double value) {
        return plain(new BigDecimal(value).round(AS_TYPED));
    }

    /** The same with four figures. */
    static String typedPlusMinus(double value) {
        return plain(new BigDecimal(value).round(new MathContext(4)));
    }

    /** The same with two figures. */
    static String typedShort(double value) {
        return plain(new BigDecimal(value).round(new MathContext(2)));
    }

    private static String plain(BigDecimal value) {
        return value.signum() == 0 ? "0" : value.stripTrailingZeros().toPlainString();
    }
}
