package org.hingeline.web.view;

import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.util.List;

/**
 * What surrounds every page.
 *
 * @param siteName name of the site shown; empty when nobody is signed in
 * @param siteCode its code
 * @param sites every site the person may see; a chooser and {@code ?site=} in links appear only when there are several
 * @param personName who is signed in; empty when nobody is
 * @param role their role at this site
 * @param csrf the token every form sends back as {@code csrf}
 * @param zone the site's time zone, as {@code Europe/Lisbon}
 * @param now when the page was made
 * @param current which entry of the navigation is the page: {@code water}, {@code alerts}, {@code messages}, {@code calculator},
 *     {@code setup} or empty
 * @param notice a sentence about what was just done ("Limit saved."); empty for none
 */
public record LayoutView(
        String siteName,
        String siteCode,
        List<SiteChoice> sites,
        String personName,
        Role role,
        String csrf,
        String zone,
        Moment now,
        String current,
        String notice) {

    /** What the signed-in person may do; each may also do what those before may. */
    public enum Role {
        VIEWER("viewer"),
        OPERATOR("operator"),
        MANAGER("manager");

        private final String word;

        Role(String word) {
            this.word = word;
        }

        /** The word for it. */
        public String word() {
            return word;
        }
    }

    public LayoutView {
        sites = List.copyOf(sites);
    }

    /** The surroundings of a page shown to somebody who is not signed in; {@code csrf} guards the sign-in form. */
    public static LayoutView signedOut(String csrf) {
        return new LayoutView("", "", List.of(), "", Role.VIEWER, csrf, "UTC", Moment.never(), "", "");
    }

    /** Whether somebody is signed in. */
    public boolean signedIn() {
        return !personName.isEmpty();
    }

    /** Whether the person may acknowledge, dose and set limits. */
    public boolean operator() {
        return signedIn() && role != Role.VIEWER;
    }

    /** Whether the person may set the site up. */
    public boolean manager() {
        return signedIn() && role == Role.MANAGER;
    }

    /** {@code path} with the site added where the person has several, keeping any {@code #fragment} last. */
    public String link(String path) {
        if (sites.size() < 2) {
            return path;
        }
        int hash = path.indexOf('#');
        String before = hash < 0 ? path : path.substring(0, hash);
        String after = hash < 0 ? "" : path.substring(hash);
        return before + (before.contains("?") ? "&" : "?") + "site=" + encoded(siteCode) + after;
    }

    /** A path of parts, each encoded: {@code link("points", code, "limits", name)}. */
    public String linkTo(String... parts) {
        StringBuilder path = new StringBuilder();
        for (String part : parts) {
            path.append('/').append(encoded(part));
        }
        return link(path.toString());
    }

    /** How the newest water state of a point was computed. */
    public String calculator(String pointCode) {
        return link("/calculator?point=" + encoded(pointCode) + "#state");
    }

    /** How the state of a point at a moment (ISO 8601) was computed. */
    public String calculator(String pointCode, String at) {
        return link("/calculator?point=" + encoded(pointCode) + "&at=" + encoded(at) + "#state");
    }

    private static String encoded(String part) {
        return URLEncoder.encode(part, StandardCharsets.UTF_8).replace("+", "%20");
    }
}
