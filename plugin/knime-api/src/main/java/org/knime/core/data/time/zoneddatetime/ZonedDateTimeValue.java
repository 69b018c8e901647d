package org.knime.core.data.time.zoneddatetime;

import java.time.ZonedDateTime;
import org.knime.core.data.DataValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ZonedDateTimeValue extends DataValue {
    ZonedDateTime getZonedDateTime();
}
