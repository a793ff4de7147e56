package org.hingeline.dosing;

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
        return DoseRequest.of(measured(), UNCERTAINTY, new Receiver.Tank(4000), target)
                .build();
    }

    static DoseRequest towards(Target target, Agent agent) {
        return towards(target).but().product(Product.pure(agent)).build();
    }

    static DoseRequest withVolumeL(DoseRequest r, double volumeL) {
        return r.but().receiver(new Receiver.Tank(volumeL)).build();
    }

    /** Of the same agent; a stock of no strength is none. */
    static DoseRequest withProduct(DoseRequest r, String form, double assayPercent, Double stockGramsPerLitre) {
        Agent agent = r.product().agent();
        return r.but()
                .product(new Product(agent, agent.form(form).orElseThrow(), assayPercent))
                .stock(stockGramsPerLitre == null ? null : new Stock(stockGramsPerLitre, null))
                .build();
    }
}
