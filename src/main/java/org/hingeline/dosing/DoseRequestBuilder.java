package org.hingeline.dosing;

import java.util.List;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.InputUncertainty;
import org.jspecify.annotations.Nullable;

/** Makes a {@link DoseRequest}; the names are those of its components. */
public final class DoseRequestBuilder {
    private @Nullable CarbonateResult water;
    private InputUncertainty uncertainty;
    private Receiver receiver;
    private Target target;
    private List<InputNote> inputNotes = List.of();
    private Product product = Product.pure(Agent.SODIUM_CARBONATE);
    private Bounds bounds = Bounds.DEFAULTS;
    private @Nullable Stock stock;
    private double aerationPco2Atm = DoseRequest.AIR_PCO2_ATM;
    private boolean larvae;
    private @Nullable Companion companion;
    private @Nullable Double ammoniaMgL;
    private @Nullable Surroundings surroundings;

    DoseRequestBuilder(
            @Nullable CarbonateResult water, InputUncertainty uncertainty, Receiver receiver, Target target) {
        this.water = water;
        this.uncertainty = uncertainty;
        this.receiver = receiver;
        this.target = target;
    }

    public DoseRequestBuilder water(@Nullable CarbonateResult given) {
        water = given;
        return this;
    }

    public DoseRequestBuilder uncertainty(InputUncertainty given) {
        uncertainty = given;
        return this;
    }

    public DoseRequestBuilder inputNotes(List<InputNote> given) {
        inputNotes = given;
        return this;
    }

    public DoseRequestBuilder receiver(Receiver given) {
        receiver = given;
        return this;
    }

    public DoseRequestBuilder target(Target given) {
        target = given;
        return this;
    }

    public DoseRequestBuilder product(Product given) {
        product = given;
        return this;
    }

    public DoseRequestBuilder bounds(Bounds given) {
        bounds = given;
        return this;
    }

    public DoseRequestBuilder stock(@Nullable Stock given) {
        stock = given;
        return this;
    }

    public DoseRequestBuilder aerationPco2Atm(double given) {
        aerationPco2Atm = given;
        return this;
    }

    public DoseRequestBuilder larvae(boolean given) {
        larvae = given;
        return this;
    }

    public DoseRequestBuilder companion(@Nullable Companion given) {
        companion = given;
        return this;
    }

    public DoseRequestBuilder ammoniaMgL(@Nullable Double given) {
        ammoniaMgL = given;
        return this;
    }

    public DoseRequestBuilder surroundings(@Nullable Surroundings given) {
        surroundings = given;
        return this;
    }

    public DoseRequest build() {
        return new DoseRequest(
                water,
                uncertainty,
                inputNotes,
                receiver,
                target,
                product,
                bounds,
                stock,
                aerationPco2Atm,
                larvae,
                companion,
                ammoniaMgL,
                surroundings);
    }
}
