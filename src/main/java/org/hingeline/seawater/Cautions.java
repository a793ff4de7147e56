package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** What to know before relying on a solved water: fits used outside their published range, and pH on NBS buffers. */
final class Cautions {
    private static final FitRange[] ALWAYS_TAKING_PART = {
        Weiss1974.RANGE,
        BoricAcid.RANGE,
        WaterDissociation.RANGE,
        Bisulfate.RANGE,
        HydrogenFluoride.RANGE,
        Mucci1983.RANGE,
        MilleroPoisson1981.RANGE
    };

    private final SeawaterConstants k;
    private @Nullable List<Caution> found;
    private @Nullable String place;

    private Cautions(SeawaterConstants k, @Nullable List<Caution> found) {
        this.k = k;
        this.found = found;
    }

    static List<Caution> of(SeawaterConstants k, Conditions conditions, KnownPair known) {
        return of(new Cautions(k, null), conditions, known);
    }

    /** The same, the fits being used at the temperature where the pH was read too. */
    static List<Caution> of(SeawaterConstants k, SeawaterConstants sample, Conditions conditions, KnownPair known) {
        Cautions ofSample = new Cautions(sample, null);
        ofSample.add(conditions);
        return of(new Cautions(k, ofSample.found), conditions, known);
    }

    private static List<Caution> of(Cautions cautions, Conditions conditions, KnownPair known) {
        cautions.add(conditions);
        KnownPh ph = known.ph();
        if (ph != null && ph.scale() == PhScale.NBS) {
            cautions.add(Takahashi1982.CAUTION);
        }
        return cautions.found == null ? List.of() : cautions.found;
    }

    /** A caution for each fit that takes part in the water and is used outside its published range. */
    private void add(Conditions conditions) {
        add(k.fit.range());
        for (FitRange range : ALWAYS_TAKING_PART) {
            add(range);
        }
        if (conditions.phosphate() > 0) {
            add(PhosphoricAcid.RANGE);
        }
        if (conditions.silicate() > 0) {
            add(SilicicAcid.RANGE);
        }
    }

    private void add(FitRange range) {
        if (!range.covers(k.temperatureC, k.salinity)) {
            if (place == null) {
                place = FitRange.place(k.temperatureC, k.salinity);
            }
            add(range.outside(place));
        }
    }

    private void add(Caution caution) {
        if (found == null) {
            found = new ArrayList<>();
        }
        if (!found.contains(caution)) {
            found.add(caution);
        }
    }
}
