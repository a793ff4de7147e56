package org.hingeline.web.view;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.hingeline.measure.Quantity;

/** One choice of a list: what is sent and what is read. */
public record Choice(String value, String label) {
    private static final List<Choice> QUANTITIES = Stream.concat(
                    Stream.of(Quantity.OMEGA_ARAGONITE, Quantity.PH_TOTAL, Quantity.OMEGA_CALCITE),
                    Arrays.stream(Quantity.values()).filter(Quantity::measured))
            .map(Choice::of)
            .toList();

    private static final List<Choice> PRIORITIES =
            List.of(new Choice("high", "high"), new Choice("medium", "medium"), new Choice("low", "low"));

    private static Choice of(Quantity quantity) {
        String name = quantity == Quantity.PH ? "pH as the sensor reads it" : quantity.words();
        String symbol = quantity.unit().symbol();
        return new Choice(quantity.code(), symbol.isEmpty() ? name : name + ", " + symbol);
    }

    /** What a limit can be set on, the computed ones first. */
    public static List<Choice> quantities() {
        return QUANTITIES;
    }

    /** How urgent a limit can be. */
    public static List<Choice> priorities() {
        return PRIORITIES;
    }
}
