package org.hingeline.monitor;

/** What the rest of this node wants to hear at once. Nothing depends on it: every listener also looks by itself. */
public interface Signals {
    /** Something at the site changed that a page shows. */
    void siteChanged(long siteId);

    /** A message was queued. */
    void messageQueued();
}
