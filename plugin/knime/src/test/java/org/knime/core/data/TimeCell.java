package org.knime.core.data;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZonedDateTime;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.knime.core.data.time.localdate.LocalDateValue;
import org.knime.core.data.time.localdatetime.LocalDateTimeValue;
import org.knime.core.data.time.zoneddatetime.ZonedDateTimeValue;

/** Cells of dates and times as the platform's date and time extension brings them. */
public abstract class TimeCell extends DataCell implements StringValue {
    private static final long serialVersionUID = 1L;

    static final List<DataType> TYPES = List.of(DataType.getType(Day.class), DataType.getType(Moment.class), DataType.getType(Zoned.class));

    static Optional<DataCellFactory> factory(final DataType type) {
        return switch (TYPES.indexOf(type)) {
            case 0 -> Optional.of(new Made(type, text -> new Day(LocalDate.parse(text))));
            case 1 -> Optional.of(new Made(type, text -> new Moment(LocalDateTime.parse(text))));
            case 2 -> Optional.of(new Made(type, text -> new Zoned(ZonedDateTime.parse(text))));
            default -> Optional.empty();
        };
    }

    private record Made(DataType type, Function<String, DataCell> maker) implements DataCellFactory.FromSimpleString {
        @Override
        public DataType getDataType() {
            return type;
        }

        @Override
        public DataCell createCell(final String input) {
            return maker.apply(input);
        }
    }

    @Override
    public String getStringValue() {
        return toString();
    }

    /** A date. */
    public static final class Day extends TimeCell implements LocalDateValue {
        private static final long serialVersionUID = 1L;
        private final LocalDate time;

        public Day(final LocalDate time) {
            super();
            this.time = time;
        }

        @Override
        public LocalDate getLocalDate() {
            return time;
        }

        @Override
        public String toString() {
            return time.toString();
        }
    }

    /** A date-time. */
    public static final class Moment extends TimeCell implements LocalDateTimeValue {
        private static final long serialVersionUID = 1L;
        private final LocalDateTime time;

        public Moment(final LocalDateTime time) {
            super();
            this.time = time;
        }

        @Override
        public LocalDateTime getLocalDateTime() {
            return time;
        }

        @Override
        public String toString() {
            return time.toString();
        }
    }

    /** A date-time with zone. */
    public static final class Zoned extends TimeCell implements ZonedDateTimeValue {
        private static final long serialVersionUID = 1L;
        private final ZonedDateTime time;

        public Zoned(final ZonedDateTime time) {
            super();
            this.time = time;
        }

        @Override
        public ZonedDateTime getZonedDateTime() {
            return time;
        }

        @Override
        public String toString() {
            return time.toString();
        }
    }
}
