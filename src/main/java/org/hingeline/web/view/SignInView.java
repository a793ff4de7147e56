package org.hingeline.web.view;

/**
 * The sign-in page.
 *
 * @param name what was typed as name
 * @param error why it was refused: "Name or password do not match."; empty for none
 * @param lockout until when no more attempts are taken: "Too many attempts. Try again at 03:25."; empty for none
 * @param next where to go afterwards, a path of this service
 */
public record SignInView(String name, String error, String lockout, String next) {}
