package ladderwell.kernel.magic;

import ladderwell.Density;
import ladderwell.Run;

/** The moving density of a run, and the name of the run. */
public record Animation(String name, Run run, Density density) {}
