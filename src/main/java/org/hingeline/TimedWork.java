package org.hingeline;

import com.github.kagkarlsson.scheduler.Scheduler;
import com.github.kagkarlsson.scheduler.task.helper.RecurringTask;
import com.github.kagkarlsson.scheduler.task.helper.Tasks;
import com.github.kagkarlsson.scheduler.task.schedule.FixedDelay;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicReference;
import org.hingeline.monitor.Check;
import org.hingeline.monitor.Housekeeping;
import org.hingeline.store.Database;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Everything that happens by the clock. Of several nodes that share a database one does each piece of work, and another
 * takes it over when that one dies.
 */
final class TimedWork implements Check, AutoCloseable {
    private static final Logger LOG = LoggerFactory.getLogger(TimedWork.class);
    private static final int THREADS = 3;
    private static final Duration FAILING_MOST = Duration.ofMinutes(1);
    private static final int LATE_STEPS_AT_ONCE = 20;

    private final Scheduler scheduler;
    private final Nudge nudge;
    private final AtomicReference<Instant> failing;
    private final InstantSource clock;

    private TimedWork(Scheduler scheduler, Nudge nudge, AtomicReference<Instant> failing, InstantSource clock) {
        this.scheduler = scheduler;
        this.nudge = nudge;
        this.failing = failing;
        this.clock = clock;
    }

    static TimedWork start(
            Database database,
            Housekeeping housekeeping,
            Nudge nudge,
            Backups backups,
            Duration backUpEvery,
            InstantSource clock) {
        List<RecurringTask<?>> tasks = new ArrayList<>();
        AtomicReference<Instant> failing = new AtomicReference<>();
        tasks.add(every("watch-limits", Duration.ofSeconds(5), noted(failing, clock, housekeeping::watchLimits)));
        tasks.add(every("late-readings", Duration.ofSeconds(3), () -> workOff(housekeeping)));
        tasks.add(every("tidy", Duration.ofHours(1), housekeeping::tidy));
        // delivery claims each message, so every node may look; the schedule only makes sure that somebody does
        tasks.add(every("deliver", Duration.ofSeconds(5), nudge::now));
        if (backups.possible()) {
            tasks.add(every("back-up", backUpEvery, backups::make));
        }
        Scheduler scheduler = Scheduler.create(database.schedulerDataSource())
                .startTasks(tasks)
                .threads(THREADS)
                .pollingInterval(Duration.ofSeconds(1))
                .heartbeatInterval(Duration.ofSeconds(20))
                .shutdownMaxWait(Duration.ofSeconds(20))
                .build();
        scheduler.start();
        return new TimedWork(scheduler, nudge, failing, clock);
    }

    /** Work that must not fail for long without anybody being told: {@link #check} tells. */
    private static Runnable noted(AtomicReference<Instant> failing, InstantSource clock, Runnable work) {
        return () -> {
            try {
                work.run();
                failing.set(null);
            } catch (RuntimeException e) {
                failing.compareAndSet(null, clock.instant());
                throw e;
            }
        };
    }

    private static RecurringTask<Void> every(String name, Duration pause, Runnable work) {
        return Tasks.recurring(name, FixedDelay.of(pause)).execute((instance, context) -> {
            try {
                work.run();
            } catch (RuntimeException e) {
                LOG.error("timed work {} failed; it runs again in {}", name, pause, e);
            }
        });
    }

    private static void workOff(Housekeeping housekeeping) {
        for (int i = 0; i < LATE_STEPS_AT_ONCE; i++) {
            if (!housekeeping.workOffLateReadings()) {
                return;
            }
        }
    }

    @Override
    public Result check() {
        if (scheduler.getSchedulerState().isShuttingDown()) {
            return new Result("timed work", false, "stopping");
        }
        Instant since = failing.get();
        if (since != null && since.plus(FAILING_MOST).isBefore(clock.instant())) {
            return new Result("timed work", false, "the watch over limits fails; the log says why");
        }
        return new Result("timed work", true, "running");
    }

    @Override
    public void close() {
        try {
            scheduler.stop();
        } finally {
            nudge.close();
        }
    }
}
