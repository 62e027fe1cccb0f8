package ladderwell.kernel.magic;

import ladderwell.Run;
import tech.tablesaw.api.Table;

/** A table of observables and the run it was read from. */
public record TableRead(Run run, Table table) {}
