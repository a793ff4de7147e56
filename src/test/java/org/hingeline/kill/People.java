package org.hingeline.kill;

import java.net.URI;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.concurrent.atomic.AtomicBoolean;
import tools.jackson.databind.JsonNode;

/** The people at the hatchery: they edit limits and acknowledge alerts. */
final class People {
    private People() {}

    /** Edits one limit over and over; the number of the edit stands in its text. */
    static final class Editor extends Writer {
        private final String point;
        private final String name;
        private final String rule;

        /** @param rule quantity and side, as JSON fields, with %s for the threshold */
        Editor(
                String point,
                String name,
                String rule,
                Place place,
                URI address,
                Promises promises,
                Random random,
                AtomicBoolean stop) {
            super(address, place.token(), promises, random, stop);
            this.point = point;
            this.name = name;
            this.rule = rule;
        }

        @Override
        int restMillis() {
            return 60;
        }

        @Override
        void write() throws Gone, InterruptedException {
            String subject = point + "/" + name;
            int number = promises.ask(subject);
            double threshold = 1.7 + random.nextInt(200) / 1000.0;
            Answer answer = send(
                    "PUT",
                    Place.limitPath(point, name),
                    "{" + rule.formatted(threshold)
                            + Place.AT_ONCE.replace("Look at the water.", "Look at the water, edit " + number + ".")
                            + "}");
            if (answer.status() == 200) {
                promises.done(subject, number);
            } else {
                promises.surprise("edit " + number + " of " + subject + " was answered " + answer.body());
            }
        }
    }

    /** Acknowledges whatever stands open. */
    static final class Acknowledger extends Writer {
        static final String SUBJECT = "acknowledgements";

        Acknowledger(Place place, URI address, Promises promises, Random random, AtomicBoolean stop) {
            super(address, place.token(), promises, random, stop);
        }

        @Override
        int restMillis() {
            return 80;
        }

        @Override
        void write() throws Gone, InterruptedException {
            List<Long> open = new ArrayList<>();
            for (JsonNode alert :
                    send("GET", "/api/v1/alerts?state=open", null).body().path("alerts")) {
                if (!alert.path("state").asString("").equals("acknowledged")) {
                    open.add(alert.path("id").asLong());
                }
            }
            if (open.isEmpty()) {
                return;
            }
            long id = open.get(random.nextInt(open.size()));
            int number = promises.ask(SUBJECT);
            String note = "seen " + number;
            Answer answer = send("POST", "/api/v1/alerts/" + id + "/acknowledgement", "{\"note\":\"" + note + "\"}");
            if (answer.status() != 200) {
                promises.surprise("acknowledging alert " + id + " was answered " + answer.body());
            } else if (note.equals(answer.body().path("note").asString(null))) {
                promises.done(SUBJECT, number);
            }
        }
    }
}
