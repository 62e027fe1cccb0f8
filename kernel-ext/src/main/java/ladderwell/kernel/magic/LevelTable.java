package ladderwell.kernel.magic;

import ladderwell.Oscillator;
import tech.tablesaw.api.Table;

/** Levels of an oscillator: the table, and which levels its picture shows. */
public record LevelTable(String name, Oscillator oscillator, Table table, long[] levels) {}
