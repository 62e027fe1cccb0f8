package ladderwell.kernel.magic;

import ladderwell.Density;
import ladderwell.PhaseFilm;
import ladderwell.Run;

/** The moving Wigner function of a run below its moving density, and the name of the run. */
public record PhaseAnimation(String name, Run run, Density density, PhaseFilm film) {}
