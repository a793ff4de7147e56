package org.hingeline.seawater;

/**
 * How the two known quantities of a water move with ln [H], inorganic carbon and everything else: the two-by-two system
 * that, inverted, tells how [H] and carbon answer.
 */
final class KnownSlopes {
    private final Sensitivity slopes;
    private final Row first;
    private final Row second;
    private final double determinant;
    /** How the first known quantity moves with the temperature of the sample that its pH was read in. */
    final double withReadingTemperature;

    /**
     * One known quantity.
     *
     * @param with slopes with the constants, temperature, salinity and calcium
     */
    private record Row(double withLnH, double withDic, double[] with) {}

    /** Of the pair that the state was solved from. */
    KnownSlopes(CarbonateState state, Sensitivity slopes) {
        this.slopes = slopes;
        KnownPair known = state.known();
        KnownPh ph = known.ph();
        double waterC = state.conditions().temperatureC();
        if (ph == null) {
            first = plain(UncertaintySource.firstOf(known));
            withReadingTemperature = 0;
        } else if (ph.readAtC(waterC) == waterC) {
            double[] with = new double[Sensitivity.PARAMETERS];
            with[Sensitivity.TEMPERATURE] = -slopes.scaleWithTemperature;
            with[Sensitivity.SALINITY] = -slopes.scaleWithSalinity;
            first = new Row(slopes.withLnH[Sensitivity.PH], 0, with);
            withReadingTemperature = 0;
        } else {
            Conditions sample = state.conditions().withTemperatureC(ph.readAtC(waterC));
            SeawaterConstants k = SeawaterConstants.of(sample);
            double h = CarbonateSystem.hydrogenIon(k, ph);
            Sensitivity there = new Sensitivity(k, sample, h, state.dic(), ph.scale());
            first = readElsewhere(there);
            withReadingTemperature = -there.scaleWithTemperature
                    + there.with[Sensitivity.TEMPERATURE][Sensitivity.TA]
                            / (there.withLnH[Sensitivity.TA] * SeawaterConstants.LN_10);
        }
        second = plain(UncertaintySource.secondOf(known));
        determinant = first.withLnH * second.withDic - first.withDic * second.withLnH;
    }

    private Row plain(UncertaintySource known) {
        int quantity = switch (known) {
            case TOTAL_ALKALINITY -> Sensitivity.TA;
            case DIC -> Sensitivity.DIC;
            case PCO2 -> Sensitivity.PCO2;
            default -> throw new IllegalArgumentException(known + " is no quantity with a row of its own");
        };
        double[] with = new double[Sensitivity.PARAMETERS];
        for (int p = 0; p < with.length; p++) {
            with[p] = slopes.with[p][quantity];
        }
        return new Row(slopes.withLnH[quantity], slopes.withDic[quantity], with);
    }

    /** The sample has the water's alkalinity and carbon, and so its pH answers to all that moves these. */
    private Row readElsewhere(Sensitivity there) {
        double phWithAlkalinity = -1 / (there.withLnH[Sensitivity.TA] * SeawaterConstants.LN_10);
        double[] with = new double[Sensitivity.PARAMETERS];
        for (int p = 0; p < with.length; p++) {
            // the sample was at its own temperature, whatever the water's
            double ofSample = p == Sensitivity.TEMPERATURE ? 0 : there.with[p][Sensitivity.TA];
            with[p] = phWithAlkalinity * (slopes.with[p][Sensitivity.TA] - ofSample);
        }
        with[Sensitivity.SALINITY] -= there.scaleWithSalinity;
        return new Row(
                phWithAlkalinity * slopes.withLnH[Sensitivity.TA],
                phWithAlkalinity * (slopes.withDic[Sensitivity.TA] - there.withDic[Sensitivity.TA]),
                with);
    }

    /** How far each quantity moves: {@link Sensitivity}'s order. */
    double[] moved(Cause cause) {
        double a = cause.first() - direct(first.with, cause);
        double b = cause.second() - direct(second.with, cause);
        double lnH = (a * second.withDic - b * first.withDic) / determinant;
        double dic = (b * first.withLnH - a * second.withLnH) / determinant;
        double[] moves = new double[Sensitivity.QUANTITIES];
        for (int q = 0; q < moves.length; q++) {
            moves[q] = slopes.withLnH[q] * lnH + slopes.withDic[q] * dic;
        }
        add(moves, Sensitivity.TEMPERATURE, cause.temperatureC());
        add(moves, Sensitivity.SALINITY, cause.salinity());
        add(moves, Sensitivity.CALCIUM, cause.calcium());
        if (cause.common()) {
            add(moves, cause.constant(), cause.ofConstant());
        }
        return moves;
    }

    private void add(double[] moves, int parameter, double amount) {
        if (amount != 0) {
            double[] direct = slopes.with[parameter];
            for (int q = 0; q < moves.length; q++) {
                moves[q] += direct[q] * amount;
            }
        }
    }

    private static double direct(double[] with, Cause cause) {
        return with[Sensitivity.TEMPERATURE] * cause.temperatureC()
                + with[Sensitivity.SALINITY] * cause.salinity()
                + with[Sensitivity.CALCIUM] * cause.calcium()
                + (cause.common() ? with[cause.constant()] * cause.ofConstant() : 0);
    }
}
