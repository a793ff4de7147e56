package org.hingeline.demo;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The water at each point of the invented hatchery: the bay at the intake, and what became of it in the tanks. */
final class HatcheryWater {
    static final String INTAKE = "intake";

    /** Fed straight from the intake, and so the first that a bad turn of the bay reaches. */
    static final String EXPOSED = "larval-3";

    private static final Duration AT_INTAKE = Duration.ofSeconds(15);
    private static final Duration AT_EXPOSED = Duration.ofSeconds(20);
    private static final double EXCURSION_INTAKE_UMOL_KG = 120;
    private static final double EXCURSION_EXPOSED_UMOL_KG = 95;

    /** Parts of equal share that stand for a tank's water, each of another age. */
    private static final int PARTS = 8;

    /**
     * A tank as the water sees it.
     *
     * @param lagH on the way from the bay
     * @param exchangeH in which the tank's water is once exchanged, well mixed
     * @param warmToC what it is held at; absent, it stays near the bay's
     * @param carbonDioxideUmolKg what the animals put in less what the air takes out
     * @param beat minutes of the heater's swing
     */
    private record Tank(double lagH, double exchangeH, double warmToC, double carbonDioxideUmolKg, double beat) {
        static final double UNHEATED = Double.NaN;
    }

    private final BayWater bay;
    private final Excursion excursion;
    private final Map<String, Tank> tanks = new LinkedHashMap<>();

    /**
     * @param origin see {@link BayWater}
     * @param start when this run began: excursions are counted from it
     */
    HatcheryWater(long seed, Instant origin, Instant start) {
        bay = new BayWater(seed, origin);
        excursion = new Excursion(start);
        tanks.put("storage", new Tank(1, 7, Tank.UNHEATED, 4, 1));
        tanks.put("larval-1", new Tank(3, 9, 22.8, 2, 47));
        tanks.put("larval-2", new Tank(3, 11, 23.4, 14, 61));
        tanks.put(EXPOSED, new Tank(0.1, 0.7, 23.0, -14, 53));
        tanks.put("larval-4", new Tank(2.5, 8, 22.4, 24, 38));
    }

    List<String> points() {
        List<String> points = new ArrayList<>(List.of(INTAKE));
        points.addAll(tanks.keySet());
        return points;
    }

    /** Metres above mean sea level, at the intake. */
    double levelM(Instant time) {
        return bay.levelM(time);
    }

    WaterBody at(String point, Instant time) {
        if (point.equals(INTAKE)) {
            double share = share(time, AT_INTAKE);
            WaterBody water = bay.at(time);
            return water.atTemperature(water.temperatureC() - 0.6 * share)
                    .withCarbonDioxide(EXCURSION_INTAKE_UMOL_KG * share);
        }
        Tank tank = tanks.get(point);
        if (tank == null) {
            throw new IllegalArgumentException("point \"" + point + "\" is not one of " + points());
        }
        WaterBody mixed = mixed(tank, time);
        double share = point.equals(EXPOSED) ? share(time, AT_EXPOSED) : 0;
        return mixed.atTemperature(temperatureC(tank, mixed, time))
                .withCarbonDioxide(
                        tank.carbonDioxideUmolKg + ofTheMeals(tank, time) + EXCURSION_EXPOSED_UMOL_KG * share);
    }

    /** Water that has just come up is low in pH as it is: an excursion then adds little. */
    private double share(Instant time, Duration arrival) {
        return excursion.at(time, arrival) * (1 - 0.75 * bay.upwelling(time));
    }

    /** Water of a well-mixed tank is of all ages, the older the rarer: one part for each eighth of that distribution. */
    private WaterBody mixed(Tank tank, Instant time) {
        List<WaterBody> parts = new ArrayList<>(PARTS);
        for (int i = 0; i < PARTS; i++) {
            double ageH = tank.lagH - tank.exchangeH * Math.log(1 - (i + 0.5) / PARTS);
            parts.add(bay.at(time.minusMillis(Math.round(ageH * 3_600_000))));
        }
        return WaterBody.mixed(parts);
    }

    private static double temperatureC(Tank tank, WaterBody mixed, Instant time) {
        double swing = Math.sin(2 * Math.PI * Wave.hours(time) * 60 / tank.beat);
        return Double.isNaN(tank.warmToC) ? mixed.temperatureC() + 0.4 : tank.warmToC + 0.12 * swing;
    }

    /** Fed twice a day, the animals breathe more for some hours. */
    private static double ofTheMeals(Tank tank, Instant time) {
        return Double.isNaN(tank.warmToC) ? 0 : 4 * Math.cos(2 * Math.PI * (Wave.hours(time) - 6) / 12);
    }
}
