package org.hingeline.monitor;

import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.hingeline.monitor.CalculatedWater.Treated;
import org.hingeline.monitor.CalculatedWater.UnionisedAmmonia;
import org.hingeline.monitor.WaterFaults.Range;
import org.hingeline.seawater.Ammonia;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPh;
import org.hingeline.seawater.Treatment;
import org.hingeline.seawater.Uncertainty;
import org.jspecify.annotations.Nullable;

/** Computes a water out of its numbers, and what it becomes. Stores nothing. */
public final class WaterCalculator {
    private static final Range SHARE = Range.of(0, 1, "");
    private static final Range AMMONIA_MG_L = Range.of(0, 1000, " mg/L as N");
    private static final Conditions USUAL = Conditions.of(Double.NaN, Double.NaN);

    /** A water that was solved, with what its uncertainty carries on; null when none is asked for. */
    private record Known(
            WishedWater wished,
            CarbonateState state,
            @Nullable Uncertainty uncertainty) {}

    /**
     * The water, with what it becomes as far as the wish asks.
     *
     * @param withUncertainty whether to compute standard uncertainties too
     * @throws FieldFaultsException with everything that cannot be taken, in the wish's units
     */
    public CalculatedWater calculate(WaterWish wish, boolean withUncertainty) {
        FieldFaults told = new FieldFaults();
        WaterFaults faults = new WaterFaults("", told);
        Known water = known(new WishReader(wish, faults), USUAL, faults, withUncertainty);
        double warmToC = faults.number("warmToC", wish.warmToC(), WishReader.TEMPERATURE_C);
        double gasUatm = faults.number("equilibrateToUatm", wish.equilibrateToUatm(), WishReader.PCO2_UATM);
        double ammoniaMgL = faults.number("ammoniaMgL", wish.ammoniaMgL(), AMMONIA_MG_L);
        Known other = other(wish, water, told, withUncertainty);
        double share = share(wish, faults);
        told.throwIfAny();
        if (water == null) {
            throw new IllegalStateException("a fault was not told");
        }
        CarbonateState state = water.state();
        Treated warmed = Double.isNaN(warmToC)
                ? null
                : treated(water, Treatment.atTemperature(state, warmToC), "warmToC", faults);
        Treated equilibrated = Double.isNaN(gasUatm)
                ? null
                : treated(water, Treatment.equilibrated(state, gasUatm / 1e6), "equilibrateToUatm", faults);
        Treated blended = other == null ? null : blended(water, other, share, faults);
        UnionisedAmmonia ammonia = Double.isNaN(ammoniaMgL) ? null : ammonia(ammoniaMgL, state, faults);
        told.throwIfAny();
        Uncertainty uncertainty = water.uncertainty();
        return new CalculatedWater(
                state,
                uncertainty == null ? null : uncertainty.ofState(),
                uncertainty == null ? Map.of() : uncertainty.ofOmegaAragoniteByOrigin(),
                water.wished().uncertainty(),
                warmed,
                equilibrated,
                blended,
                ammonia,
                cautions(water, ammonia),
                method(water, withUncertainty, ammonia != null));
    }

    /**
     * A water that a dose is planned for.
     *
     * @param path where it stands in the request
     * @return null when the faults say why not; numbers that no water has are a result all the same
     */
    DoseWaters.@Nullable Water toDose(WaterWish wish, String path, FieldFaults told) {
        WaterFaults faults = new WaterFaults(path, told);
        WishReader reader = new WishReader(wish, faults);
        reader.refuseTreatments("a dose is planned for the water as it is");
        WishedWater wished = reader.read(USUAL);
        CarbonateResult result = wished == null ? null : wished.solve(faults);
        Unsolvable refusal = faults.asUnsolvable();
        if (refusal != null) {
            return new DoseWaters.Water(refusal, InputUncertainty.DEFAULTS, List.of());
        }
        return wished == null || result == null
                ? null
                : new DoseWaters.Water(result, wished.uncertainty(), List.of(), wished.cautions());
    }

    private static @Nullable Known known(
            WishReader reader, Conditions usual, WaterFaults faults, boolean withUncertainty) {
        WishedWater wished = reader.read(usual);
        CarbonateResult result = wished == null ? null : wished.solve(faults);
        faults.tellImpossible();
        if (wished == null || !(result instanceof Solved solved)) {
            return null;
        }
        CarbonateState state = solved.state();
        return new Known(
                wished,
                state,
                withUncertainty
                        ? Uncertainty.ofMeasured(state, wished.uncertainty(), ConstantUncertainty.ORR_2018)
                        : null);
    }

    private static @Nullable Known other(
            WaterWish wish, @Nullable Known water, FieldFaults told, boolean withUncertainty) {
        WaterWish.Blend blend = wish.blendWith();
        if (blend == null) {
            return null;
        }
        WaterWish other = blend.water();
        if (other == null) {
            told.add("blendWith/water", "blendWith/water is missing; a water like this one is accepted");
            return null;
        }
        WaterFaults faults = new WaterFaults("blendWith/water", told);
        WishReader reader = new WishReader(other, faults);
        reader.refuseTreatments("it belongs beside blendWith, to the water that is asked about");
        return known(reader, water == null ? USUAL : water.state().conditions(), faults, withUncertainty);
    }

    private static double share(WaterWish wish, WaterFaults faults) {
        WaterWish.Blend blend = wish.blendWith();
        if (blend == null) {
            return Double.NaN;
        }
        if (blend.massShare() == null) {
            faults.add(
                    "blendWith/massShare",
                    "blendWith/massShare is missing: the other water's share of the mass; 0 to 1 is accepted");
        }
        return faults.number("blendWith/massShare", blend.massShare(), SHARE);
    }

    private static @Nullable Treated treated(Known water, CarbonateResult result, String field, WaterFaults faults) {
        if (!(result instanceof Solved solved)) {
            notFound(field, result, faults);
            return null;
        }
        Uncertainty uncertainty = water.uncertainty();
        return new Treated(
                solved.state(),
                uncertainty == null
                        ? null
                        : uncertainty.carriedTo(solved.state()).ofState(),
                solved.state().cautions());
    }

    private static @Nullable Treated blended(Known water, Known other, double share, WaterFaults faults) {
        CarbonateResult result = Treatment.blended(water.state(), other.state(), share);
        if (!(result instanceof Solved solved)) {
            notFound("blendWith", result, faults);
            return null;
        }
        CarbonateState blend = solved.state();
        Uncertainty ofWater = water.uncertainty();
        Uncertainty ofOther = other.uncertainty();
        return new Treated(
                blend,
                ofWater == null || ofOther == null
                        ? null
                        : ofWater.blendedWith(ofOther, share, blend).ofState(),
                joined(
                        blend.cautions(),
                        joined(other.state().cautions(), other.wished().cautions()).stream()
                                .map(c -> new Caution(c.code(), "Of the water mixed in: " + c.detail()))
                                .toList()));
    }

    /** What only a failure of the root finder could bring: every number was judged before. */
    private static void notFound(String field, CarbonateResult result, WaterFaults faults) {
        String code = result instanceof Unsolvable refusal ? refusal.reason().code() : "";
        faults.add(field, field + ": no state was found for what the water becomes (" + code + ")");
    }

    private static @Nullable UnionisedAmmonia ammonia(double totalMgL, CarbonateState state, WaterFaults faults) {
        double ph = state.phTotal();
        double temperatureC = state.conditions().temperatureC();
        double salinity = state.conditions().salinity();
        if (!(Ammonia.unionisedShare(ph, temperatureC, salinity) instanceof Figure.Known share)) {
            faults.add(
                    "ammoniaMgL",
                    "ammoniaMgL " + WaterFaults.plain(totalMgL) + " cannot be split at the water's phTotal "
                            + Math.rint(ph * 100) / 100 + ": pH 2 to 13 is accepted");
            return null;
        }
        return new UnionisedAmmonia(
                share.value(),
                Ammonia.unionisedNitrogenMgL(totalMgL, ph, temperatureC, salinity)
                        .orElseThrow(),
                Ammonia.unionisedNh3MgL(totalMgL, ph, temperatureC, salinity).orElseThrow(),
                share.cautions());
    }

    private static List<Caution> cautions(Known water, @Nullable UnionisedAmmonia ammonia) {
        List<Caution> own = joined(water.state().cautions(), water.wished().cautions());
        return ammonia == null ? own : joined(own, ammonia.cautions());
    }

    private static List<Caution> joined(List<Caution> some, List<Caution> more) {
        return more.isEmpty()
                ? some
                : Stream.concat(some.stream(), more.stream()).distinct().toList();
    }

    private static WaterMethod method(Known water, boolean withUncertainty, boolean withAmmonia) {
        Conditions conditions = water.state().conditions();
        KnownPh ph = water.wished().known().ph();
        Double readAtC = ph == null ? null : ph.readAtC();
        return new WaterMethod(
                conditions.fit(),
                conditions.boron(),
                ph == null ? null : ph.scale(),
                readAtC != null && readAtC != conditions.temperatureC(),
                water.wished().salinityFromConductivity(),
                conditions.calcium() != null,
                withUncertainty,
                withAmmonia);
    }
}
