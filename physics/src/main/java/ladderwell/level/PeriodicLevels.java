package ladderwell.level;

public final class PeriodicLevels { PeriodicLevels(PotentialCurve c, double period, double phase) { } }
