package org.modestead.host.bench.trial;

import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.junit.jupiter.api.extension.ConditionEvaluationResult;
import org.junit.jupiter.api.extension.ExecutionCondition;
import org.junit.jupiter.api.extension.ExtendWith;
import org.junit.jupiter.api.extension.ExtensionContext;

/** Tests that are skipped, and say so, where there is no browser. */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@ExtendWith(NeedsBrowser.Condition.class)
@interface NeedsBrowser {

    /** Looks for the browser. */
    final class Condition implements ExecutionCondition {

        @Override
        public ConditionEvaluationResult evaluateExecutionCondition(ExtensionContext context) {
            return Chromium.find().isPresent() ? ConditionEvaluationResult.enabled("there is a browser")
                    : ConditionEvaluationResult.disabled("no chromium with its chromedriver on the path (packages chromium and chromium-driver)");
        }
    }
}
