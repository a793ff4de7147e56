package org.hingeline.dosing;

import java.util.List;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** The worked water, and questions about it with one thing changed. */
final class Waters {
    static final InputUncertainty UNCERTAINTY = InputUncertainty.ofPhAndAlkalinity(0.02, 17e-6, 0.1, 0.1);

    private Waters() {}

    /** 22 °C, salinity 30, TA 2078 µmol/kg, pCO2 900 µatm. */
    static CarbonateState worked() {
        return CarbonateSystem.solve(Conditions.of(22, 30), new AlkalinityAndPco2(2078e-6, 900e-6))
                .orElseThrow();
    }

    /** The same as a sensor and a titration give it. */
    static CarbonateResult measured() {
        return CarbonateSystem.solve(Conditions.of(22, 30), new PhAndAlkalinity(worked().phTotal(), 2078e-6));
    }

    static DoseRequest towards(Target target) {
        return DoseRequest.ofSodiumCarbonate(measured(), UNCERTAINTY, 4000, target);
    }

    static DoseRequest withWater(DoseRequest r, CarbonateResult water) {
        return new DoseRequest(
                water,
                r.uncertainty(),
                r.inputNotes(),
                r.receiver(),
                r.target(),
                r.agent(),
                r.form(),
                r.assayPercent(),
                r.bounds(),
                r.stockGramsPerLitre(),
                r.aerationPco2Atm());
    }

    static DoseRequest withNotes(DoseRequest r, InputNote... notes) {
        return new DoseRequest(
                r.water(),
                r.uncertainty(),
                List.of(notes),
                r.receiver(),
                r.target(),
                r.agent(),
                r.form(),
                r.assayPercent(),
                r.bounds(),
                r.stockGramsPerLitre(),
                r.aerationPco2Atm());
    }

    static DoseRequest withVolumeL(DoseRequest r, double volumeL) {
        return new DoseRequest(
                r.water(),
                r.uncertainty(),
                r.inputNotes(),
                new Receiver.Tank(volumeL),
                r.target(),
                r.agent(),
                r.form(),
                r.assayPercent(),
                r.bounds(),
                r.stockGramsPerLitre(),
                r.aerationPco2Atm());
    }

    static DoseRequest withProduct(DoseRequest r, String form, double assayPercent, Double stockGramsPerLitre) {
        return new DoseRequest(
                r.water(),
                r.uncertainty(),
                r.inputNotes(),
                r.receiver(),
                r.target(),
                r.agent(),
                r.agent().form(form).orElseThrow(),
                assayPercent,
                r.bounds(),
                stockGramsPerLitre,
                r.aerationPco2Atm());
    }

    static DoseRequest withBounds(DoseRequest r, Bounds bounds) {
        return new DoseRequest(
                r.water(),
                r.uncertainty(),
                r.inputNotes(),
                r.receiver(),
                r.target(),
                r.agent(),
                r.form(),
                r.assayPercent(),
                bounds,
                r.stockGramsPerLitre(),
                r.aerationPco2Atm());
    }

    static DoseRequest withAeration(DoseRequest r, double pco2Atm) {
        return new DoseRequest(
                r.water(),
                r.uncertainty(),
                r.inputNotes(),
                r.receiver(),
                r.target(),
                r.agent(),
                r.form(),
                r.assayPercent(),
                r.bounds(),
                r.stockGramsPerLitre(),
                pco2Atm);
    }
}
