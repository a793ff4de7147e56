package org.hingeline.web.view;

/**
 * Something went wrong.
 *
 * @param status the HTTP status
 * @param title what happened, for the reader: "There is no such page."
 * @param detail what they can do; may be empty
 */
public record ErrorView(int status, String title, String detail) {

    /** The usual words for a status. */
    public static ErrorView of(int status) {
        return switch (status) {
            case 403 ->
                new ErrorView(
                        status,
                        "This is not open to you.",
                        "Your role does not allow it, or the form was open too long. Go back, load the page again and retry; "
                                + "if it stays closed, ask a manager of the site.");
            case 404 ->
                new ErrorView(
                        status, "There is no such page here.", "The point or alert may have been renamed or removed.");
            default ->
                status >= 500
                        ? new ErrorView(
                                status,
                                "Something failed on our side.",
                                "Try again. If it fails again, do not wait for this page: look at the water itself, and tell whoever "
                                        + "runs this service what you did and when.")
                        : new ErrorView(
                                status, "That could not be done.", "Go back, check what was entered and try again.");
        };
    }
}
