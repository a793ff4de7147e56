package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Batch;
import org.hingeline.measure.Quantity;
import org.hingeline.quality.Flag;

/** The paragraphs that messages about alerts are put together from. */
final class AlertBody {
    private final StringBuilder text = new StringBuilder();
    private final AlertNews news;
    private boolean uncertaintyShown;

    AlertBody(AlertNews news) {
        this.news = news;
    }

    void line(String line) {
        uncertaintyShown |= line.contains("±");
        text.append(line).append('\n');
    }

    void gap() {
        text.append('\n');
    }

    String text() {
        return text.toString();
    }

    void whatToDo() {
        line("What to do: " + Wording.oneLine(news.alert().action()));
        line("Priority: " + news.alert().priority().code() + ".");
    }

    void whenItCountsAsBack() {
        AlertBook.Alert alert = news.alert();
        double deadband = news.limit().deadband();
        boolean below = alert.side() == Side.BELOW;
        // a sum of decimals is not the decimal sum: 1.8 + 0.05 must not show as 1.8500000000000001
        double back = Math.rint((alert.threshold() + (below ? deadband : -deadband)) * 1e6) / 1e6;
        Duration offDelay = news.limit().offDelay();
        line("It counts as back at "
                + Wording.withUnit(
                        Wording.asSet(alert.quantity(), back), alert.quantity().unit())
                + (below ? " or more" : " or less")
                + (offDelay.isZero() ? "" : " for " + Wording.length(offDelay)) + ".");
    }

    void batch() {
        Batch batch = news.batch();
        if (batch == null) {
            return;
        }
        Duration age = batch.age(news.now());
        String when = age.isNegative()
                ? "spawning expected " + time(batch.spawnedAt())
                : Wording.length(age) + " after spawning"
                        + (batch.buildsFirstShell(news.now()) ? ": building its first shell now" : "");
        line("In the tank: batch " + batch.code() + ", " + Wording.oneLine(batch.species()) + ", " + when + ".");
    }

    /** What the water is now. */
    void water() {
        WaterState water = news.water();
        gap();
        if (water == null) {
            line("No water state of this point is known.");
            return;
        }
        state("The water at " + time(water.at()), water);
    }

    /** What the water was when it was last known. */
    void lastKnownWater() {
        WaterState water = news.water();
        gap();
        if (water == null) {
            line("No water state of this point is known.");
            return;
        }
        state("Last known, at " + time(water.at()), water);
    }

    void links() {
        gap();
        line("The point: " + news.pointLink());
        line("All alerts, and to acknowledge: " + news.alertsLink());
    }

    void footer() {
        gap();
        if (uncertaintyShown) {
            line("± is the combined standard uncertainty: about two times in three the true value lies within it.");
        }
        line("Times are those of " + news.site().zone().getId() + ". Written "
                + Wording.dayAndTime(news.now(), news.site().zone()) + ".");
    }

    static String lastHeardOf(WaterState.MissingInput missing, AlertNews news) {
        Instant newest = missing.newestAt();
        String words = missing.quantity().words();
        return newest == null
                ? words + " never heard"
                : words + " last heard "
                        + Wording.time(newest, news.now(), news.site().zone());
    }

    private void state(String heading, WaterState water) {
        line(heading + ":");
        WaterNumbers numbers = water.numbers();
        if (numbers != null) {
            line("  Ω aragonite "
                    + Wording.withUncertainty(numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty(), 2));
            line("  pH "
                    + Wording.withUncertainty(
                            numbers.phTotal(),
                            numbers.phTotalUncertainty(),
                            numbers.phTotalUncertainty() < 0.01 ? 3 : 2)
                    + " on the total scale, temperature " + Wording.number(numbers.temperatureC(), 1)
                    + " °C, salinity " + Wording.number(numbers.salinity(), 1) + ", total alkalinity "
                    + Wording.number(numbers.totalAlkalinityUmolKg(), 0) + " µmol/kg");
        }
        if (!water.inputs().isEmpty()) {
            line("From these readings:");
            water.inputs().forEach(this::input);
        }
        if (!water.missing().isEmpty()) {
            line("Missing:");
            water.missing()
                    .forEach(missing -> line("  " + lastHeardOf(missing, news) + "; used up to "
                            + Wording.length(missing.allowedAge()) + " old"));
        }
        cautions(water);
    }

    private void input(WaterState.InputUsed input) {
        Quantity quantity = input.quantity();
        String scale = quantity == Quantity.PH ? " on the sensor's scale" : "";
        line("  " + quantity.words() + " "
                + Wording.withUnit(
                        Wording.number(input.value(), quantity == Quantity.PH ? 3 : Wording.decimals(quantity)),
                        quantity.unit())
                + scale + ", " + input.source() + " at " + time(input.at()) + ", "
                + Wording.length(Duration.between(input.at(), news.now())) + " ago"
                + (input.flag() == Flag.SUSPECT ? ", SUSPECT" : ""));
    }

    private void cautions(WaterState water) {
        if (!water.suspect() && water.cautions().isEmpty()) {
            return;
        }
        gap();
        if (water.suspect()) {
            line("Caution: an input is marked suspect, and so is everything worked out from it. Check that sensor.");
        }
        water.cautions().forEach(note -> line("Caution: " + Wording.oneLine(note.detail())));
    }

    private String time(Instant time) {
        return Wording.time(time, news.now(), news.site().zone());
    }
}
