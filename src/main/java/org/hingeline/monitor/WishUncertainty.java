package org.hingeline.monitor;

import org.hingeline.monitor.WaterFaults.Range;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/** Reads the standard uncertainties of a wished water into the core's units, the usual ones where none are given. */
final class WishUncertainty {
    /** Gives a salinity about 0.1 together with the usual 0.1 °C. */
    private static final double CONDUCTIVITY_UNCERTAINTY_MS_CM = 0.1;

    private static final WaterWish.Uncertainty NONE =
            new WaterWish.Uncertainty(null, null, null, null, null, null, null, null);

    private final WaterWish.Uncertainty given;
    private final WaterFaults faults;

    WishUncertainty(WaterWish.@Nullable Uncertainty given, WaterFaults faults) {
        this.given = given == null ? NONE : given;
        this.faults = faults;
    }

    double ofConductivityMsCm() {
        return notNegative("conductivityMsCm", given.conductivityMsCm(), CONDUCTIVITY_UNCERTAINTY_MS_CM, 20, " mS/cm");
    }

    void refuseThatOfSalinity() {
        refuseUnused("salinity", given.salinity(), "conductivityMsCm");
    }

    void refuseThatOfConductivity() {
        refuseUnused("conductivityMsCm", given.conductivityMsCm(), "salinity");
    }

    private void refuseUnused(String name, @Nullable Double value, String measured) {
        if (value != null) {
            String field = "uncertainty/" + name;
            faults.add(
                    field,
                    faults.at(field) + " " + WaterFaults.plain(value) + " is not used: the water is given by its "
                            + measured + "; uncertainty/" + measured + " is accepted");
        }
    }

    /** Those that were given, the usual ones for the rest; salinity as if it had been given. */
    InputUncertainty inputs(PhScale scale) {
        InputUncertainty usual = InputUncertainty.DEFAULTS;
        double usualPh = scale == PhScale.NBS ? InputUncertainty.PH_ON_NBS_BUFFERS : usual.ph();
        return new InputUncertainty(
                notNegative("ph", given.ph(), usualPh, 1, ""),
                notNegative(
                                "totalAlkalinityUmolKg",
                                given.totalAlkalinityUmolKg(),
                                usual.totalAlkalinity() * 1e6,
                                10_000,
                                " µmol/kg")
                        / 1e6,
                notNegative("dicUmolKg", given.dicUmolKg(), usual.dic() * 1e6, 10_000, " µmol/kg") / 1e6,
                notNegative("pco2Uatm", given.pco2Uatm(), usual.pco2Atm() * 1e6, 100_000, " µatm") / 1e6,
                notNegative("temperatureC", given.temperatureC(), usual.temperatureC(), 10, " °C"),
                notNegative("salinity", given.salinity(), usual.salinity(), 10, ""),
                notNegative("calciumMmolKg", given.calciumMmolKg(), usual.calcium() * 1e3, 10, " mmol/kg") / 1e3);
    }

    private double notNegative(String name, @Nullable Double value, double usual, double most, String unit) {
        if (value == null) {
            return usual;
        }
        double number = faults.number("uncertainty/" + name, value, Range.of(0, most, unit));
        return Double.isNaN(number) ? usual : number;
    }
}
