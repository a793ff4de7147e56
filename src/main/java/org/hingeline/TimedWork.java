package org.hingeline;

import com.github.kagkarlsson.scheduler.Scheduler;
import com.github.kagkarlsson.scheduler.task.helper.RecurringTask;
import com.github.kagkarlsson.scheduler.task.helper.Tasks;
import com.github.kagkarlsson.scheduler.task.schedule.FixedDelay;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
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
    private static final int LATE_STEPS_AT_ONCE = 20;

    private final Scheduler scheduler;
    private final Nudge nudge;

    private TimedWork(Scheduler scheduler, Nudge nudge) {
        this.scheduler = scheduler;
        this.nudge = nudge;
    }

    static TimedWork start(
            Database database, Housekeeping housekeeping, Nudge nudge, Backups backups, Duration backUpEvery) {
        List<RecurringTask<?>> tasks = new ArrayList<>();
        tasks.add(every("watch-limits", Duration.ofSeconds(5), housekeeping::watchLimits));
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
        return new TimedWork(scheduler, nudge);
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
        boolean running = !scheduler.getSchedulerState().isShuttingDown();
        return new Result("timed work", running, running ? "running" : "stopping");
    }

    @Override
    public void close() {
        scheduler.stop();
        nudge.close();
    }
}
