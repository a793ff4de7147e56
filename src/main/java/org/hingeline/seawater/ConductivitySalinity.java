package org.hingeline.seawater;

import java.util.Optional;

/**
 * Practical salinity from conductivity and temperature, and back: PSS-78 with its extension to low salinities
 * ({@link PracticalSalinity1978}, {@link HillDauphineeWoods1986}).
 *
 * <p>Conductivity in mS/cm as measured at the temperature, not referred to 25 °C or any other. Temperature in °C, ITS-90.
 * Accepted: −2 to 45 °C, up to a salinity of 50, sea pressure 0 to 10,000 dbar; PSS-78 itself holds for salinity 2 to 42
 * and −2 to 35 °C, and outside the answer carries a caution. Anything else is refused, not-a-number included.
 */
public final class ConductivitySalinity {
    /** Where it holds, the extension included: salinity 0 to 42, −2 to 35 °C. */
    public static final FitRange RANGE = PracticalSalinity1978.RANGE;

    /** The code of a refused conductivity. */
    public static final String CONDUCTIVITY_CODE = "conductivity-out-of-range";

    /** The code of a refused pressure. */
    public static final String PRESSURE_CODE = "pressure-out-of-range";

    /** The code of a refused uncertainty. */
    public static final String UNCERTAINTY_CODE = "uncertainty-out-of-range";

    private static final double PRESSURE_MAX_DBAR = 10_000;
    private static final double CONDUCTIVITY_MAX_MS_CM = 200;

    /** √Rt of a salinity of 50 lies below this at any accepted temperature. */
    private static final double ROOT_RATIO_MAX = 1.5;

    /** Steps of the derivatives: far below any instrument, far above rounding. */
    private static final double CONDUCTIVITY_STEP = 1e-5;

    private static final double TEMPERATURE_STEP_C = 1e-3;

    private ConductivitySalinity() {}

    /** Practical salinity at the surface; see {@link #salinity(double, double, double)}. */
    public static Figure salinity(double conductivityMsCm, double temperatureC) {
        return salinity(conductivityMsCm, temperatureC, 0);
    }

    /**
     * Practical salinity.
     *
     * @param conductivityMsCm conductivity at that temperature and pressure, mS/cm
     * @param temperatureC temperature, °C (ITS-90)
     * @param pressureDbar sea pressure, dbar: 0 at the surface
     * @return practical salinity, without unit, or a refusal
     */
    public static Figure salinity(double conductivityMsCm, double temperatureC, double pressureDbar) {
        Optional<Figure.Refused> refused = refusal(conductivityMsCm, temperatureC, pressureDbar);
        if (refused.isPresent()) {
            return refused.get();
        }
        double salinity = raw(conductivityMsCm, temperatureC, pressureDbar);
        if (!(salinity <= SolvableWater.SALINITY_MAX)) {
            return new Figure.Refused(
                    UnsolvableReason.SALINITY_NOT_COVERED.code(),
                    "conductivity " + conductivityMsCm + " mS/cm at " + temperatureC + " °C is beyond a salinity of "
                            + SolvableWater.SALINITY_MAX + ", up to which it is computed");
        }
        return new Figure.Known(salinity, FigureCheck.cautions(temperatureC, salinity, RANGE));
    }

    /** Conductivity at the surface; see {@link #conductivity(double, double, double)}. */
    public static Figure conductivity(double salinity, double temperatureC) {
        return conductivity(salinity, temperatureC, 0);
    }

    /**
     * The conductivity a water of that practical salinity has: the inverse of {@link #salinity(double, double, double)}.
     *
     * @param salinity practical salinity, 0 to 50
     * @param temperatureC temperature, °C (ITS-90)
     * @param pressureDbar sea pressure, dbar
     * @return mS/cm, or a refusal
     */
    public static Figure conductivity(double salinity, double temperatureC, double pressureDbar) {
        Optional<Figure.Refused> refused =
                FigureCheck.water(temperatureC, salinity).or(() -> pressure(pressureDbar));
        if (refused.isPresent()) {
            return refused.get();
        }
        double t68 = temperatureC * PracticalSalinity1978.T68_OVER_T90;
        double rootRt = salinity == 0 ? 0 : rootRatio(salinity, t68);
        double ratio = PracticalSalinity1978.ratio(rootRt * rootRt, t68, pressureDbar);
        return new Figure.Known(
                ratio * PracticalSalinity1978.STANDARD_MS_CM, FigureCheck.cautions(temperatureC, salinity, RANGE));
    }

    /**
     * The standard uncertainty of a salinity at the surface from those of its two measurements, taken as independent, to
     * first order.
     *
     * @param conductivityMsCm conductivity, mS/cm
     * @param temperatureC temperature, °C (ITS-90)
     * @param conductivityUncertainty standard uncertainty, mS/cm
     * @param temperatureUncertainty standard uncertainty, °C
     * @return practical salinity, or a refusal; the scale itself adds about 0.001, which is not counted
     */
    public static Figure uncertainty(
            double conductivityMsCm,
            double temperatureC,
            double conductivityUncertainty,
            double temperatureUncertainty) {
        Figure salinity = salinity(conductivityMsCm, temperatureC);
        if (!(salinity instanceof Figure.Known known)) {
            return salinity;
        }
        Optional<Figure.Refused> refused = uncertainty("conductivity", conductivityUncertainty)
                .or(() -> uncertainty("temperature", temperatureUncertainty));
        if (refused.isPresent()) {
            return refused.get();
        }
        Slopes slopes = slopes(conductivityMsCm, temperatureC);
        return new Figure.Known(
                Math.hypot(
                        slopes.perConductivity() * conductivityUncertainty,
                        slopes.perDegree() * temperatureUncertainty),
                known.cautions());
    }

    /**
     * How a salinity at the surface moves with what it was computed from.
     *
     * @param perConductivity 1/(mS/cm)
     * @param perDegree 1/°C
     */
    public record Slopes(double perConductivity, double perDegree) {}

    /**
     * The slopes where {@link #salinity(double, double)} gives a number.
     *
     * @throws IllegalStateException with the refusal's words where it gives none
     */
    public static Slopes slopes(double conductivityMsCm, double temperatureC) {
        salinity(conductivityMsCm, temperatureC).orElseThrow();
        double step = Math.max(conductivityMsCm, 1) * CONDUCTIVITY_STEP;
        double low = Math.max(0, conductivityMsCm - step);
        double high = conductivityMsCm + step;
        return new Slopes(
                (raw(high, temperatureC, 0) - raw(low, temperatureC, 0)) / (high - low),
                (raw(conductivityMsCm, temperatureC + TEMPERATURE_STEP_C, 0)
                                - raw(conductivityMsCm, temperatureC - TEMPERATURE_STEP_C, 0))
                        / (2 * TEMPERATURE_STEP_C));
    }

    private static double raw(double conductivityMsCm, double temperatureC, double pressureDbar) {
        return PracticalSalinity1978.salinity(
                conductivityMsCm / PracticalSalinity1978.STANDARD_MS_CM,
                temperatureC * PracticalSalinity1978.T68_OVER_T90,
                pressureDbar);
    }

    /** √Rt of a salinity above 0. The factor of the extension is found once, since it hangs on the temperature alone. */
    private static double rootRatio(double salinity, double t68) {
        if (salinity >= HillDauphineeWoods1986.BELOW) {
            return Bisection.root(root -> PracticalSalinity1978.ofRootRatio(root, t68) - salinity, 0, ROOT_RATIO_MAX);
        }
        double unscaled = salinity / HillDauphineeWoods1986.scale(t68);
        return Bisection.root(
                root -> HillDauphineeWoods1986.asPublished(PracticalSalinity1978.ofRootRatio(root, t68), root, t68)
                        - unscaled,
                0,
                ROOT_RATIO_MAX);
    }

    private static Optional<Figure.Refused> refusal(double conductivity, double temperatureC, double pressure) {
        return FigureCheck.within(CONDUCTIVITY_CODE, "conductivity", conductivity, 0, CONDUCTIVITY_MAX_MS_CM, " mS/cm")
                .or(() -> FigureCheck.water(temperatureC, 0))
                .or(() -> pressure(pressure));
    }

    private static Optional<Figure.Refused> pressure(double pressureDbar) {
        return FigureCheck.within(PRESSURE_CODE, "sea pressure", pressureDbar, 0, PRESSURE_MAX_DBAR, " dbar");
    }

    private static Optional<Figure.Refused> uncertainty(String of, double value) {
        return FigureCheck.within(UNCERTAINTY_CODE, "the uncertainty of " + of, value, 0, Double.MAX_VALUE, "");
    }
}
