package org.hingeline.measure;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * The units in which each quantity is accepted and shown, the canonical one first.
 *
 * <p>Alkalinity and dissolved amounts per litre follow from these definitions:
 *
 * <ul>
 *   <li>1 meq/L of alkalinity is 1 mmol/L of charge, which ½ mmol/L of CaCO₃ neutralises: {@value #MG_CACO3_PER_MEQ} mg/L
 *       as CaCO₃;
 *   <li>1 dKH, the German degree of carbonate hardness, is 10 mg/L of CaO: 1 meq/L, or ½ mmol/L of CaO, is {@value
 *       #DKH_PER_MEQ} dKH, and 1 dKH is 17.85 mg/L as CaCO₃.
 * </ul>
 *
 * Molar masses, g/mol: Ca 40.078, C 12.011, O 15.999, N 14.007 (IUPAC 2021, abridged).
 */
public final class Units {
    private static final double CALCIUM_G_MOL = 40.078;
    private static final double CARBON_G_MOL = 12.011;
    private static final double OXYGEN_G_MOL = 15.999;
    private static final double NITROGEN_G_MOL = 14.007;

    /** CaCO₃ that neutralises as much acid as 1 meq of alkalinity, mg: half its molar mass. */
    public static final double MG_CACO3_PER_MEQ = (CALCIUM_G_MOL + CARBON_G_MOL + 3 * OXYGEN_G_MOL) / 2;

    private static final double MG_CAO_PER_LITRE_PER_DKH = 10;

    /** Degrees of carbonate hardness in 1 meq/L: half the molar mass of CaO over 10 mg/L. */
    public static final double DKH_PER_MEQ = (CALCIUM_G_MOL + OXYGEN_G_MOL) / 2 / MG_CAO_PER_LITRE_PER_DKH;

    /** µmol in a meq of alkalinity. */
    private static final double UMOL_PER_MEQ = 1000;

    private static final double PA_PER_ATM = 101_325;

    private static final Map<Quantity, List<UnitChoice>> CHOICES = new EnumMap<>(Quantity.class);

    static {
        for (Quantity quantity : Quantity.values()) {
            List<UnitChoice> choices = new ArrayList<>(plain(quantity));
            choices.addAll(perLitre(quantity));
            CHOICES.put(quantity, List.copyOf(choices));
        }
    }

    private Units() {}

    /** The units of a quantity in the order to offer them, the canonical one first. */
    public static List<UnitChoice> of(Quantity quantity) {
        return CHOICES.getOrDefault(quantity, List.of());
    }

    /**
     * The unit that a text names, by UCUM code or a plain form such as {@code dKH}.
     *
     * @return empty when the quantity is not accepted in it
     */
    public static Optional<UnitChoice> find(Quantity quantity, String text) {
        return of(quantity).stream().filter(choice -> choice.named(text)).findFirst();
    }

    /** The UCUM codes of a quantity, as one comma-separated list for error texts. */
    public static String codes(Quantity quantity) {
        return of(quantity).stream().map(UnitChoice::ucum).collect(Collectors.joining(", "));
    }

    /** The codes of those that need no density, as one comma-separated list for error texts. */
    public static String codesWithoutDensity(Quantity quantity) {
        return of(quantity).stream()
                .filter(choice -> !choice.perLitre())
                .map(UnitChoice::ucum)
                .collect(Collectors.joining(", "));
    }

    private static List<UnitChoice> plain(Quantity quantity) {
        return switch (quantity) {
            // practical salinity is often sent as parts per thousand
            case SALINITY -> List.of(by("1", "PSS-78", 1), by("[ppth]", "ppt", 1));
            case OMEGA_ARAGONITE, OMEGA_CALCITE -> List.of(by("1", "", 1));
            case PH, PH_TOTAL -> List.of(new UnitChoice("[pH]", "pH", 1, 0, false, List.of("1")));
            case TEMPERATURE ->
                List.of(
                        by("Cel", "\u00b0C", 1),
                        new UnitChoice("[degF]", "\u00b0F", 5.0 / 9.0, -160.0 / 9.0, false, List.of()),
                        new UnitChoice("K", "K", 1, -273.15, false, List.of()));
            case CONDUCTIVITY ->
                List.of(by("mS/cm", "mS/cm", 1), by("S/m", "S/m", 10), by("uS/cm", "\u00b5S/cm", 1e-3));
            case TOTAL_ALKALINITY, DIC ->
                List.of(by("umol/kg", "\u00b5mol/kg", 1), by("mmol/kg", "mmol/kg", 1e3), by("mol/kg", "mol/kg", 1e6));
            case CALCIUM ->
                List.of(by("mmol/kg", "mmol/kg", 1), by("umol/kg", "\u00b5mol/kg", 1e-3), by("mol/kg", "mol/kg", 1e3));
            case PCO2 -> List.of(by("uatm", "\u00b5atm", 1), by("Pa", "Pa", 1e6 / PA_PER_ATM));
            case DISSOLVED_OXYGEN ->
                List.of(
                        by("mg/L", "mg/L", 1),
                        by("ug/L", "\u00b5g/L", 1e-3),
                        by("umol/L", "\u00b5mol/L", 2 * OXYGEN_G_MOL * 1e-3));
            case AMMONIA ->
                List.of(
                        by("mg/L", "mg/L as N", 1),
                        by("ug/L", "\u00b5g/L as N", 1e-3),
                        by("mmol/L", "mmol/L", NITROGEN_G_MOL),
                        by("umol/L", "\u00b5mol/L", NITROGEN_G_MOL * 1e-3));
            case FLOW ->
                List.of(
                        by("L/min", "L/min", 1),
                        by("m3/h", "m\u00b3/h", VolumeUnit.CUBIC_METRE.litres() / 60),
                        by("L/h", "L/h", 1.0 / 60),
                        by("[gal_us]/min", "US gal/min", VolumeUnit.US_GALLON.litres()));
            case LEVEL ->
                List.of(by("m", "m", 1), by("cm", "cm", 0.01), by("mm", "mm", 0.001), by("[ft_i]", "ft", 0.3048));
            case SILENCE -> List.of(by("min", "min", 1), by("s", "s", 1.0 / 60.0), by("h", "h", 60));
        };
    }

    private static List<UnitChoice> perLitre(Quantity quantity) {
        return switch (quantity) {
            case TOTAL_ALKALINITY ->
                List.of(
                        litre("meq/L", "meq/L", UMOL_PER_MEQ),
                        litre("mmol/L", "mmol/L", 1e3),
                        litre("umol/L", "\u00b5mol/L", 1),
                        litre(
                                "mg/L",
                                "mg/L as CaCO\u2083",
                                UMOL_PER_MEQ / MG_CACO3_PER_MEQ,
                                "mg/L{CaCO3}",
                                "mg/L as CaCO3",
                                "mg/L as CaCO\u2083"),
                        litre("{dKH}", "dKH", UMOL_PER_MEQ / DKH_PER_MEQ, "dKH"));
            case DIC ->
                List.of(
                        litre("mmol/L", "mmol/L", 1e3),
                        litre("umol/L", "\u00b5mol/L", 1),
                        litre("mg/L", "mg/L as C", 1e3 / CARBON_G_MOL, "mg/L{C}", "mg/L as C"));
            case CALCIUM ->
                List.of(litre("mmol/L", "mmol/L", 1), litre("mg/L", "mg/L as Ca", 1 / CALCIUM_G_MOL, "mg/L as Ca"));
            default -> List.of();
        };
    }

    private static UnitChoice by(String ucum, String label, double factor) {
        return new UnitChoice(ucum, label, factor, 0, false, List.of());
    }

    private static UnitChoice litre(String ucum, String label, double factor, String... alsoWritten) {
        return new UnitChoice(ucum, label, factor, 0, true, List.of(alsoWritten));
    }
}
