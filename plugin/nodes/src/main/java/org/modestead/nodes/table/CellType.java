package org.modestead.nodes.table;

import java.util.Optional;

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
    ZONED_DATE_TIME("date-time with zone"),
    /** {@link ListCell} of numbers. */
    DOUBLE_LIST("list of numbers", DOUBLE),
    /** {@link ListCell} of whole numbers. */
    LONG_LIST("list of whole numbers", LONG),
    /** {@link ListCell} of texts. */
    TEXT_LIST("list of texts", TEXT),
    /** {@link ListCell} of true or false. */
    FLAG_LIST("list of true/false", FLAG),
    /** {@link ListCell} of dates. */
    DATE_LIST("list of dates", DATE),
    /** {@link ListCell} of date-times. */
    DATE_TIME_LIST("list of date-times", DATE_TIME),
    /** {@link ListCell} of date-times with zone. */
    ZONED_DATE_TIME_LIST("list of date-times with zone", ZONED_DATE_TIME);

    private final String title;
    private final Optional<CellType> entries;

    CellType(String title) {
        this.title = title;
        this.entries = Optional.empty();
    }

    CellType(String title, CellType entries) {
        this.title = title;
        this.entries = Optional.of(entries);
    }

    /** Returns the type of lists whose entries have a type; empty for lists of lists, which there are none. */
    public static Optional<CellType> listOf(CellType entries) {
        for (CellType type : values()) {
            if (type.entries.equals(Optional.of(entries))) {
                return Optional.of(type);
            }
        }
        return Optional.empty();
    }

    /** Returns the type's name for people. */
    public String title() {
        return title;
    }

    /** Returns the type of a list's entries, empty when this is no list. */
    public Optional<CellType> entries() {
        return entries;
    }

    /** Returns whether a column of this type can be a measured channel. */
    public boolean isNumber() {
        return this == DOUBLE || this == LONG;
    }

    /** Returns whether a column of this type can be several measured channels, one an entry. */
    public boolean isNumberList() {
        return this == DOUBLE_LIST || this == LONG_LIST;
    }

    /** Returns whether a column of this type can be the time of a recording. */
    public boolean isTime() {
        return isNumber() || this == DATE || this == DATE_TIME || this == ZONED_DATE_TIME;
    }
}
