package org.hingeline.seawater;

import java.math.BigDecimal;
import java.math.MathContext;

/** Arithmetic to 34 digits, with exponential and logarithm by their series: nothing is shared with the product. */
final class HighPrecision {
    static final MathContext MC = new MathContext(34);
    private static final BigDecimal TWO = BigDecimal.valueOf(2);
    private static final BigDecimal NEGLIGIBLE = new BigDecimal("1e-36");
    private static final BigDecimal LN_2 = lnNearOne(TWO);
    static final BigDecimal LN_10 = ln(BigDecimal.TEN);

    private HighPrecision() {}

    static BigDecimal num(String digits) {
        return new BigDecimal(digits);
    }

    static BigDecimal num(double value) {
        return new BigDecimal(value);
    }

    static BigDecimal sqrt(BigDecimal x) {
        return x.sqrt(MC);
    }

    static BigDecimal over(BigDecimal a, BigDecimal b) {
        return a.divide(b, MC);
    }

    static BigDecimal times(BigDecimal... factors) {
        BigDecimal product = BigDecimal.ONE;
        for (BigDecimal factor : factors) {
            product = product.multiply(factor, MC);
        }
        return product;
    }

    static BigDecimal sum(BigDecimal... terms) {
        BigDecimal total = BigDecimal.ZERO;
        for (BigDecimal term : terms) {
            total = total.add(term, MC);
        }
        return total;
    }

    /** Taylor series after halving the argument twenty times. */
    static BigDecimal exp(BigDecimal x) {
        MathContext guard = new MathContext(48);
        BigDecimal small = x.divide(TWO.pow(20), guard);
        BigDecimal term = BigDecimal.ONE;
        BigDecimal total = BigDecimal.ONE;
        for (int n = 1; term.abs().compareTo(new BigDecimal("1e-50")) > 0; n++) {
            term = term.multiply(small, guard).divide(BigDecimal.valueOf(n), guard);
            total = total.add(term, guard);
        }
        for (int i = 0; i < 20; i++) {
            total = total.multiply(total, guard);
        }
        return total.round(MC);
    }

    static BigDecimal tenTo(BigDecimal x) {
        return exp(times(x, LN_10));
    }

    static BigDecimal ln(BigDecimal x) {
        int twos = 0;
        BigDecimal reduced = x;
        while (reduced.compareTo(num("1.5")) > 0) {
            reduced = over(reduced, TWO);
            twos++;
        }
        while (reduced.compareTo(num("0.75")) < 0) {
            reduced = times(reduced, TWO);
            twos--;
        }
        return sum(lnNearOne(reduced), times(LN_2, BigDecimal.valueOf(twos)));
    }

    static BigDecimal log10(BigDecimal x) {
        return over(ln(x), LN_10);
    }

    /** ln x = 2 artanh((x − 1)/(x + 1)). */
    private static BigDecimal lnNearOne(BigDecimal x) {
        MathContext guard = new MathContext(44);
        BigDecimal z = x.subtract(BigDecimal.ONE).divide(x.add(BigDecimal.ONE), guard);
        BigDecimal square = z.multiply(z, guard);
        BigDecimal power = z;
        BigDecimal total = z;
        for (int n = 3; power.abs().compareTo(NEGLIGIBLE.movePointLeft(6)) > 0; n += 2) {
            power = power.multiply(square, guard);
            total = total.add(power.divide(BigDecimal.valueOf(n), guard), guard);
        }
        return total.multiply(TWO, MC);
    }
}
