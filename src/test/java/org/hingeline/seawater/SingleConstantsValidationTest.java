package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/** Holds each published fit against values printed or computed elsewhere. */
class SingleConstantsValidationTest {
    @ParameterizedTest
    @CsvFileSource(resources = "/reference/single-constants.csv", useHeadersInDisplayName = true)
    void agrees_with_the_published_value(
            String quantity, double temperatureC, double salinity, double value, double tolerance, String source) {
        assertThat(evaluate(quantity, temperatureC, salinity))
                .as("%s (source %s)", quantity, source)
                .isCloseTo(value, within(tolerance));
    }

    static double evaluate(String quantity, double temperatureC, double s) {
        double t = temperatureC + 273.15;
        SeawaterConstants k =
                SeawaterConstants.of(temperatureC, s, CarbonicAcidFit.LUEKER_2000, BoronRatio.UPPSTROM_1974);
        return switch (quantity) {
            case "lnK0" -> Math.log(k.k0);
            case "K0" -> k.k0;
            case "log10K1.lueker2000" -> Math.log10(k.k1);
            case "log10K2.lueker2000" -> Math.log10(k.k2);
            case "lnKB" -> Math.log(k.kb);
            case "lnKW" -> Math.log(k.kw);
            case "lnKS" -> Math.log(k.ks);
            case "lnKF" -> Math.log(k.kf);
            case "lnKP1" -> Math.log(k.kp1);
            case "lnKP2" -> Math.log(k.kp2);
            case "lnKP3" -> Math.log(k.kp3);
            case "lnKSi" -> Math.log(k.ksi);
            case "log10KspAragonite" -> Math.log10(k.kspAragonite);
            case "log10KspCalcite" -> Math.log10(k.kspCalcite);
            case "sulfate" -> k.sulfate;
            case "fluoride" -> k.fluoride;
            case "calcium" -> k.calciumFromSalinity;
            case "boron.uppstrom1974" -> k.boron;
            case "boron.lee2010" -> BoronRatio.LEE_2010.totalBoron(s);
            case "pK1.millero2006.seawaterScale" -> Millero2006.pK1(t, s);
            case "pK2.millero2006.seawaterScale" -> Millero2006.pK2(t, s);
            case "densityKgM3" -> k.densityKgM3();
            case "heatCapacity" -> MilleroPerronDesnoyers1973.heatCapacity(temperatureC, s);
            case "phFreeMinusTotal" -> PhScale.FREE.fromTotal(8, temperatureC, s) - 8;
            case "phTotalMinusSeawater" -> PhScale.SEAWATER.toTotal(8, temperatureC, s) - 8;
            case "phNbsMinusTotal" -> PhScale.NBS.fromTotal(8, temperatureC, s) - 8;
            case "trisPh" -> TrisStandard.ph(temperatureC, s).orElseThrow();
            case "unionisedAmmoniaAtPh8.0" -> CleggWhitfield1995.unionisedShare(8.0, temperatureC, s);
            case "unionisedAmmoniaAtPh8.5" -> CleggWhitfield1995.unionisedShare(8.5, temperatureC, s);
            default -> throw new IllegalArgumentException("no such quantity: " + quantity);
        };
    }
}
