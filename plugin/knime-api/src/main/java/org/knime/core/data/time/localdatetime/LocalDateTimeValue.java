package org.knime.core.data.time.localdatetime;

import java.time.LocalDateTime;
import org.knime.core.data.DataValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface LocalDateTimeValue extends DataValue {
    LocalDateTime getLocalDateTime();
}
