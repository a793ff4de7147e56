/**
 * Takes messages from the outbox to people: at least once, with growing pauses, by whichever node claims them first.
 *
 * <p>A message is claimed in one transaction, sent outside any, and marked in another. A crash between sending and
 * marking repeats it; the repeat carries the same Message-ID, by which mail programs know it.
 */
@NullMarked
package org.hingeline.delivery;

import org.jspecify.annotations.NullMarked;
