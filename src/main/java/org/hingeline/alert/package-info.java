/**
 * Limits and the life of an alert, as one pure function.
 *
 * <p>States are those of ISA-18.2 / IEC 62682:
 *
 * <pre>
 *               out of limit for on-delay
 *   NORMAL ───────────────────────────────────▶ UNACKNOWLEDGED ◀──────────────┐
 *     ▲ ▲                                          │        │                 │
 *     │ │                              acknowledge │        │ back for        │ out again
 *     │ │ back for off-delay                       ▼        ▼ off-delay       │ for on-delay
 *     │ └───────────────────────────── ACKNOWLEDGED    RETURNED_UNACKNOWLEDGED┘
 *     │                                                     │
 *     └─────────────────────────────────────────────────────┘ acknowledge
 * </pre>
 *
 * <p>Time is the time of the observation, not of its arrival. An observation older than the newest one seen changes
 * nothing, and one too old to speak of the present never raises: late data completes the record, it does not ring
 * anybody's phone about the past.
 */
@NullMarked
package org.hingeline.alert;

import org.jspecify.annotations.NullMarked;
