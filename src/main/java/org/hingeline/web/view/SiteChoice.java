package org.hingeline.web.view;

/** One of the sites a person may look at; {@code chosen} marks the one on the page. */
public record SiteChoice(String code, String name, boolean chosen) {}
