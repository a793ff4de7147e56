package org.hingeline.monitor;

import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.PeopleBook.Membership;

/**
 * Who is asking: a person in a browser or a script with a token.
 *
 * @param name goes into the journal
 * @param csrf what a form of this browser session must send back; empty for a token
 * @param memberships the sites they may see and what they may do there
 */
public record Caller(String name, String csrf, List<Membership> memberships) {
    public Caller {
        memberships = List.copyOf(memberships);
    }

    /** Whether this is a browser, whose forms must prove where they come from. */
    public boolean browser() {
        return !csrf.isEmpty();
    }

    public Optional<Membership> at(String siteCode) {
        return memberships.stream()
                .filter(m -> m.site().code().equals(siteCode))
                .findFirst();
    }

    /** The codes of their sites, for error texts. */
    public String siteCodes() {
        return String.join(
                ", ", memberships.stream().map(Membership::site).map(Site::code).toList());
    }
}
