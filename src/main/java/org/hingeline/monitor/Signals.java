package org.hingeline.monitor;

/** What the rest of this node wants to hear at once. Nothing depends on it: every listener also looks by itself. */
@FunctionalInterface
public interface Signals {
    /** Something at the site changed that a page shows, or a message was queued. */
    void siteChanged(long siteId);
}
