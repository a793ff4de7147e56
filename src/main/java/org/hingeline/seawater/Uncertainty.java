package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;

/**
 * First-order propagation of the standard uncertainties of inputs and constants to every quantity of a solved water, and
 * on to what that water becomes (JCGM 100:2008, eq. 10, independent inputs).
 *
 * <p>A water is fixed by ln [H] and inorganic carbon; the two known quantities are functions of these and of the
 * parameters (constants, temperature, salinity, calcium). Inverting that two-by-two system tells how [H] and carbon
 * answer to each independent {@link Cause}, and the chain rule carries it to all quantities: one way for every pair. A
 * water that is warmed, aerated or blended inherits the causes of the one it was, with the moves of alkalinity and carbon
 * that each makes; so what both have in common cancels when the two are compared.
 */
public final class Uncertainty {
    private final CarbonateState state;
    private final List<Cause> causes;
    private final List<double[]> moves;

    private Uncertainty(CarbonateState state, KnownSlopes slopes, List<Cause> causes) {
        this.state = state;
        this.causes = causes;
        this.moves = new ArrayList<>(causes.size());
        for (Cause cause : causes) {
            moves.add(slopes.moved(cause));
        }
    }

    private Uncertainty(CarbonateState state, List<Cause> causes) {
        this(state, new KnownSlopes(state, sensitivity(state, PhScale.TOTAL)), causes);
    }

    /** With the uncertainties of the constants of {@link ConstantUncertainty#ORR_2018}. */
    public static StateUncertainty of(CarbonateState state, InputUncertainty inputs) {
        return of(state, inputs, ConstantUncertainty.ORR_2018);
    }

    /**
     * The standard uncertainty of every quantity of a solved water.
     *
     * @param state a water solved by {@link CarbonateSystem} from what was measured
     * @param inputs of what was measured; a pH on NBS buffers counts with at least
     *     {@link InputUncertainty#PH_ON_NBS_BUFFERS}
     * @param constants of the equilibrium constants and total boron
     */
    public static StateUncertainty of(CarbonateState state, InputUncertainty inputs, ConstantUncertainty constants) {
        return ofMeasured(state, inputs, constants).ofState();
    }

    /** The same, to be followed on to what the water becomes. */
    public static Uncertainty ofMeasured(CarbonateState state, InputUncertainty inputs, ConstantUncertainty constants) {
        KnownPair known = state.known();
        KnownPh ph = known.ph();
        Sensitivity sensitivity = sensitivity(state, ph == null ? PhScale.TOTAL : ph.scale());
        KnownSlopes slopes = new KnownSlopes(state, sensitivity);
        double[] ofConstants = constants.asLogarithms();
        List<Cause> causes = new ArrayList<>(ofConstants.length + 6);
        for (int p = 0; p < ofConstants.length; p++) {
            causes.add(Cause.constant(p, ofConstants[p]));
        }
        causes.add(Cause.input(UncertaintySource.firstOf(known), 0, 0, 0, first(known, inputs), 0));
        causes.add(Cause.input(UncertaintySource.secondOf(known), 0, 0, 0, 0, second(known, inputs)));
        causes.add(Cause.input(
                UncertaintySource.TEMPERATURE,
                inputs.temperatureC(),
                inputs.salinityPerDegree() * inputs.temperatureC(),
                0,
                0,
                0));
        causes.add(Cause.input(UncertaintySource.SALINITY, 0, inputs.salinity(), 0, 0, 0));
        if (state.conditions().calcium() != null) {
            causes.add(Cause.input(UncertaintySource.CALCIUM, 0, 0, inputs.calcium(), 0, 0));
        }
        if (slopes.withReadingTemperature != 0) {
            // the thermometer at the electrode: the pH that the sample had where it was thought to be
            causes.add(Cause.input(
                    UncertaintySource.TEMPERATURE_AT_PH,
                    0,
                    0,
                    0,
                    -slopes.withReadingTemperature * inputs.temperatureC(),
                    0));
        }
        return new Uncertainty(state, slopes, causes);
    }

    /**
     * Of what the water became when it was warmed, cooled, aerated or dosed: a state solved from alkalinity and inorganic
     * carbon, or from alkalinity and a given pCO2. What was set (another temperature, the pCO2, a dose) counts as exact.
     *
     * @throws IllegalArgumentException when the state was solved from another pair
     */
    public Uncertainty carriedTo(CarbonateState to) {
        boolean closed = to.known() instanceof AlkalinityAndDic;
        if (!closed && !(to.known() instanceof AlkalinityAndPco2)) {
            throw new IllegalArgumentException("not a water that another became: " + to.known());
        }
        boolean sameTemperature =
                state.conditions().temperatureC() == to.conditions().temperatureC();
        List<Cause> carried = new ArrayList<>(causes.size());
        for (int i = 0; i < causes.size(); i++) {
            Cause cause = causes.get(i);
            double[] move = moves.get(i);
            carried.add(new Cause(
                    cause.source(),
                    cause.constant(),
                    cause.ofConstant(),
                    sameTemperature ? cause.temperatureC() : 0,
                    cause.salinity(),
                    cause.calcium(),
                    move[Sensitivity.TA],
                    closed ? move[Sensitivity.DIC] : 0));
        }
        return new Uncertainty(to, carried);
    }

    /**
     * Of a blend of this water and another, measured independently; the constants are the same for both.
     *
     * @param other of the other water
     * @param shareOfOther its share of the mass, 0 to 1
     * @param blend the state of the blend
     */
    public Uncertainty blendedWith(Uncertainty other, double shareOfOther, CarbonateState blend) {
        double heat = Blend.heatShareOfOther(state.conditions(), other.state.conditions(), shareOfOther);
        List<Cause> blended = new ArrayList<>(causes.size() + other.causes.size());
        for (int i = 0; i < causes.size(); i++) {
            Cause own = partOf(i, 1 - shareOfOther, 1 - heat, blend);
            blended.add(own.common() ? own.with(other.partOf(i, shareOfOther, heat, blend)) : own);
        }
        for (int i = 0; i < other.causes.size(); i++) {
            if (!other.causes.get(i).common()) {
                blended.add(other.partOf(i, shareOfOther, heat, blend));
            }
        }
        return new Uncertainty(blend, blended);
    }

    /** What a cause does to a blend that this water is a share of, by mass and by heat. */
    private Cause partOf(int i, double share, double heatShare, CarbonateState blend) {
        Cause cause = causes.get(i);
        double[] move = moves.get(i);
        // beside a measured calcium, one from salinity still moves with it
        boolean fromSalinity =
                state.conditions().calcium() == null && blend.conditions().calcium() != null;
        double calcium = fromSalinity ? SeaSalt.calcium(cause.salinity()) : cause.calcium();
        return new Cause(
                cause.source(),
                cause.constant(),
                cause.ofConstant(),
                heatShare * cause.temperatureC(),
                share * cause.salinity(),
                share * calcium,
                share * move[Sensitivity.TA],
                share * move[Sensitivity.DIC]);
    }

    /** Of every quantity of the state. */
    public StateUncertainty ofState() {
        double[] fromConstants = new double[Sensitivity.QUANTITIES];
        double[] fromInputs = new double[Sensitivity.QUANTITIES];
        for (int i = 0; i < moves.size(); i++) {
            addSquares(causes.get(i).common() ? fromConstants : fromInputs, moves.get(i));
        }
        return StateUncertainty.ofVariances(fromConstants, fromInputs);
    }

    /** The standard uncertainty of Ω of aragonite that each origin alone would give; together, in quadrature, the total. */
    public Map<UncertaintySource, Double> ofOmegaAragoniteBySource() {
        Map<UncertaintySource, Double> shares = new EnumMap<>(UncertaintySource.class);
        for (int i = 0; i < moves.size(); i++) {
            shares.merge(causes.get(i).source(), Math.abs(moves.get(i)[Sensitivity.OMEGA_ARAGONITE]), Math::hypot);
        }
        return shares;
    }

    /**
     * Of the difference between this state and one that it was carried to, cause by cause: what both share cancels.
     *
     * @throws IllegalArgumentException when the other does not stem from this one
     */
    public StateUncertainty ofChangeTo(Uncertainty later) {
        if (later.causes.size() != causes.size()) {
            throw new IllegalArgumentException("the later water does not stem from this one");
        }
        double[] fromConstants = new double[Sensitivity.QUANTITIES];
        double[] fromInputs = new double[Sensitivity.QUANTITIES];
        for (int i = 0; i < moves.size(); i++) {
            double[] change = later.moves.get(i).clone();
            for (int q = 0; q < change.length; q++) {
                change[q] -= moves.get(i)[q];
            }
            addSquares(causes.get(i).common() ? fromConstants : fromInputs, change);
        }
        return StateUncertainty.ofVariances(fromConstants, fromInputs);
    }

    private static void addSquares(double[] variance, double[] move) {
        for (int q = 0; q < variance.length; q++) {
            variance[q] += move[q] * move[q];
        }
    }

    private static Sensitivity sensitivity(CarbonateState state, PhScale scale) {
        return new Sensitivity(
                state.constants(),
                state.conditions(),
                Math.exp(-state.phTotal() * SeawaterConstants.LN_10),
                state.dic(),
                scale);
    }

    private static double first(KnownPair known, InputUncertainty inputs) {
        double stated = of(UncertaintySource.firstOf(known), inputs);
        KnownPh ph = known.ph();
        return ph != null && ph.scale() == PhScale.NBS ? Math.max(stated, InputUncertainty.PH_ON_NBS_BUFFERS) : stated;
    }

    private static double second(KnownPair known, InputUncertainty inputs) {
        return of(UncertaintySource.secondOf(known), inputs);
    }

    private static double of(UncertaintySource known, InputUncertainty inputs) {
        return switch (known) {
            case PH -> inputs.ph();
            case TOTAL_ALKALINITY -> inputs.totalAlkalinity();
            case DIC -> inputs.dic();
            case PCO2 -> inputs.pco2Atm();
            default -> throw new IllegalArgumentException(known + " is no known quantity");
        };
    }
}
