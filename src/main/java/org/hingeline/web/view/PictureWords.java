package org.hingeline.web.view;

import org.hingeline.measure.Quantity;
import org.hingeline.web.view.OmegaField.Range;
import org.hingeline.web.view.OmegaPicture.Reading;
import org.jspecify.annotations.Nullable;

/** The picture in words, for whoever does not see it and for whoever wants the number. */
final class PictureWords {
    private PictureWords() {}

    /** "pH 7.3 to 8.1", "alkalinity 1 680 to 2 480 µmol/kg". */
    static String span(Reading reading, Range range) {
        double width = range.high() - range.low();
        return reading.with(AxisTicks.reading(range.low(), reading.conversion(), width) + " to "
                + AxisTicks.reading(range.high(), reading.conversion(), width));
    }

    /** "Ω rises with pH and falls with pCO₂." */
    static String slopes(OmegaField field, Reading first, Reading second) {
        String one = verb(field.first(), field);
        String other = verb(field.second(), field);
        return "\u03a9 " + one + " with " + first.name() + " and " + (one.equals(other) ? "" : other + " ") + "with "
                + second.name() + ".";
    }

    private static String verb(Quantity quantity, OmegaField field) {
        boolean first = quantity == field.first();
        double value = first ? field.firstValue() : field.secondValue();
        double step = Math.max(1e-3, 1e-3 * Math.abs(value));
        double here = field.at(field.firstValue(), field.secondValue());
        double there = first ? field.at(value + step, field.secondValue()) : field.at(field.firstValue(), value + step);
        return there > here ? "rises" : "falls";
    }

    /** "Ω 1.80, your limit, lies at pH 7.78 with this alkalinity, and at alkalinity 2 310 µmol/kg with this pH." */
    static String reach(
            OmegaField field, Reading first, Reading second, Range across, Range up, @Nullable Double limit) {
        double level = limit == null ? 1 : limit;
        double x = field.firstFor(level, across);
        double y = field.secondFor(level, up);
        String byFirst = Double.isNaN(x)
                ? ""
                : "at " + first.with(AxisTicks.reading(x, first.conversion(), across.high() - across.low()))
                        + " with this " + second.name();
        String bySecond = Double.isNaN(y)
                ? ""
                : "at " + second.with(AxisTicks.reading(y, second.conversion(), up.high() - up.low())) + " with this "
                        + first.name();
        String both = byFirst.isEmpty() || bySecond.isEmpty() ? byFirst + bySecond : byFirst + ", or " + bySecond;
        String what = limit == null
                ? "\u03a9 1, below which aragonite dissolves,"
                : "\u03a9 " + AxisTicks.label(level, 2) + ", your limit,";
        return both.isEmpty()
                ? (limit == null ? "" : what + " lies outside the picture.")
                : what + " lies " + both + ".";
    }
}
