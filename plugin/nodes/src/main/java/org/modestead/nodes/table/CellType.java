package org.modestead.nodes.table;

/** What a column holds. A missing cell is {@code null} in every type. */
public enum CellType {
    /** 64-bit floating point, read as {@link Double}. */
    DOUBLE("number"),
    /** 64-bit whole number, read as {@link Long}. */
    LONG("whole number"),
    /** Text, read as {@link String}. */
    TEXT("text"),
    /** True or false, read as {@link Boolean}. */
    FLAG("true/false"),
    /** Calendar date, read as {@link java.time.LocalDate}. */
    DATE("date"),
    /** Date and time without zone, read as {@link java.time.LocalDateTime}. */
    DATE_TIME("date-time"),
    /** Date and time with zone, read as {@link java.time.ZonedDateTime}. */
    ZONED_DATE_TIME("date-time with zone");

    private final String title;

    CellType(String title) {
        this.title = title;
    }

    /** Returns the type's name for people. */
    public String title() {
        return title;
    }

    /** Returns whether a column of this type can be a measured channel. */
    public boolean isNumber() {
        return this == DOUBLE || this == LONG;
    }

    /** Returns whether a column of this type can be the time of a recording. */
    public boolean isTime() {
        return isNumber() || this == DATE || this == DATE_TIME || this == ZONED_DATE_TIME;
    }
}
