package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.concurrent.CountDownLatch;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;

class AttendedWorkTest {

    private static final Progress STOPPED = new Progress() {
        @Override
        public void report(double fraction, String message) {
            // nobody watches
        }

        @Override
        public void checkCancelled() {
            throw new Cancelled("asked to stop");
        }
    };

    @Test
    void theResultComesFromAnotherThread() {
        String here = Thread.currentThread().getName();
        assertNotEquals(here, AttendedWork.result(() -> Thread.currentThread().getName(), Progress.NONE, "work"));
    }

    @Test
    void workThatNeverAsksIsLeftWhenThePersonStops() {
        CountDownLatch never = new CountDownLatch(1);
        try {
            Cancelled stopped = assertThrows(Cancelled.class, () -> AttendedWork.result(() -> await(never), STOPPED, "work"));
            assertEquals("asked to stop", stopped.getMessage());
            assertEquals(1, never.getCount(), "the work had not ended");
        } finally {
            never.countDown();
        }
    }

    private static boolean await(CountDownLatch latch) {
        try {
            latch.await();
            return true;
        } catch (InterruptedException stop) {
            return false;
        }
    }

    @Test
    void whatTheWorkThrowsIsThrownAsItIs() {
        FitFault fault = new FitFault("rank", "it is 0", "give 1");
        assertSame(fault, assertThrows(FitFault.class, () -> AttendedWork.result(() -> {
            throw fault;
        }, Progress.NONE, "work")));
        StackOverflowError error = new StackOverflowError();
        assertSame(error, assertThrows(StackOverflowError.class, () -> AttendedWork.result(() -> {
            throw error;
        }, Progress.NONE, "work")));
    }
}
