package org.knime.core.data.time.localdate;

import java.time.LocalDate;
import org.knime.core.data.DataValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface LocalDateValue extends DataValue {
    LocalDate getLocalDate();
}
