package org.hingeline.web.view;

import java.util.List;

/** What was sent to whom, newest first. */
public record MessagesView(List<Entry> messages) {

    /** How a message stands. */
    public enum State {
        WAITING("waiting to be sent"),
        SENT("sent"),
        RETRYING("not through yet, being retried"),
        GIVEN_UP("given up");

        private final String words;

        State(String words) {
            this.words = words;
        }

        /** The state in words. */
        public String words() {
            return words;
        }

        /** The name used in style sheets. */
        public String css() {
            return name().toLowerCase(java.util.Locale.ROOT).replace('_', '-');
        }
    }

    /**
     * One message.
     *
     * @param to whom, with the address: "Ana Reis, ana@example.org"
     * @param channel "e-mail", "SMS"
     * @param written when it was put in the outbox
     * @param state how it stands
     * @param detail what is known of its way: "at 03:01", "third try failed: connection refused; next try 03:20"; may be empty
     * @param subject its subject or first words
     * @param text the whole of it
     */
    public record Entry(
            String to, String channel, Moment written, State state, String detail, String subject, String text) {}

    public MessagesView {
        messages = List.copyOf(messages);
    }
}
