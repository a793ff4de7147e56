package org.hingeline.measure;

/**
 * From a unit people and gateways use to the canonical one and back: {@code canonical = factor * value + offset}.
 *
 * <p>Which units a quantity is accepted in is told by {@link Units}. A unit per litre has a conversion only once the
 * density is known: {@link UnitChoice#conversion(double)}.
 *
 * @param ucum UCUM code of the unit
 */
public record UnitConversion(String ucum, double factor, double offset) {

    public UnitConversion {
        if (!(Double.isFinite(factor) && factor > 0 && Double.isFinite(offset))) {
            throw new IllegalArgumentException("conversion of " + ucum + ": factor " + factor + ", offset " + offset);
        }
    }

    /** The value in the canonical unit. */
    public double toCanonical(double value) {
        return factor * value + offset;
    }

    /** A value in the canonical unit as a value in this one. */
    public double fromCanonical(double canonical) {
        return (canonical - offset) / factor;
    }

    /** A standard uncertainty (a difference, so without the offset) in the canonical unit. */
    public double uncertaintyToCanonical(double standardUncertainty) {
        return factor * standardUncertainty;
    }

    /** A standard uncertainty in the canonical unit as one in this unit. */
    public double uncertaintyFromCanonical(double standardUncertainty) {
        return standardUncertainty / factor;
    }
}
