package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.ANGULAR_FREQUENCY;
import static ladderwell.quantity.Kind.CYCLE_FREQUENCY;
import static ladderwell.quantity.Kind.ENERGY;
import static ladderwell.quantity.Kind.LENGTH;
import static ladderwell.quantity.Kind.MASS;
import static ladderwell.quantity.Kind.MOMENTUM;
import static ladderwell.quantity.Kind.PERIODS;
import static ladderwell.quantity.Kind.TIME;
import static ladderwell.quantity.Kind.WAVENUMBER;

import java.util.List;
import java.util.Optional;
import ladderwell.quantity.Kind;

/**
 * The table of the language. Reading, completion, help and the reference page all come from it; a new noun, kind or key is
 * one entry here and one class that carries it out.
 *
 * @param nouns the nouns, in the order in which they are offered
 */
public record Grammar(List<Noun> nouns) {
    /** The first line of a cell of sentences, without the two percent signs. */
    public static final String CELL = "declare";

    /** Most characters of a sentence, so that every text is answered in bounded time. */
    public static final int LONGEST_SENTENCE = 100_000;

    private static final Key MASS_KEY = Key.quantity("mass", "mass of the particle", MASS);
    private static final Key NATURAL =
            Key.of("natural", Form.FLAG, "", "natural units: values are plain numbers, without units");
    private static final Key WIDTH = Key.quantity("width", "full width L, from wall to wall", LENGTH);

    private static final NounKind HARMONIC = NounKind.of(
                    "harmonic",
                    "harmonic oscillator",
                    "the motion of a trapped ion, a cavity mode, a small vibration: levels evenly spaced",
                    "H = p²/2m + mω²x²/2,  E_n = ħω(n + ½)")
            .keys(
                    MASS_KEY,
                    Key.quantity(
                                    "frequency",
                                    "cycle frequency ν in Hz, or angular frequency ω in rad/s or /s",
                                    CYCLE_FREQUENCY,
                                    ANGULAR_FREQUENCY)
                            .formula("ω = 2πν for ν in Hz; a rate in rad/s or /s is ω as it stands"),
                    Key.quantity("wavenumber", "wavenumber ν̃ = 1/λ of the transition between neighbours", WAVENUMBER)
                            .formula("ω = 2πcν̃"),
                    Key.quantity("spacing", "spacing of the levels as an energy", ENERGY)
                            .formula("ω = E/ħ"),
                    NATURAL.formula("ħ = m = ω = 1"))
            .ways(
                    Way.of("mass", "frequency"),
                    Way.of("mass", "wavenumber"),
                    Way.of("mass", "spacing"),
                    Way.of("natural"));

    private static final NounKind BOX = NounKind.of(
                    "box",
                    "box",
                    "a particle between two walls that nothing passes",
                    "V = 0 for |x| < L/2, infinite outside,  E_n = π²ħ²(n + 1)²/2mL²")
            .alias("infinite well")
            .keys(MASS_KEY, WIDTH, NATURAL.formula("ħ = m = L = 1"))
            .ways(Way.of("mass", "width"), Way.of("natural"));

    private static final NounKind FINITE_WELL = NounKind.of(
                    "finite well",
                    "finite well",
                    "a particle in a square well of finite depth, such as an electron in a quantum well",
                    "V = 0 for |x| < L/2, V₀ outside")
            .keys(
                    MASS_KEY,
                    WIDTH,
                    Key.quantity("depth", "depth V₀ of the well", ENERGY),
                    NATURAL.formula("ħ = m = L = 1; the depth is counted in ħ²/mL²"))
            .ways(Way.of("mass", "width", "depth"), Way.of("natural", "depth"));

    private static final NounKind NUMBER = NounKind.of(
                    "number",
                    "number state",
                    "one level of the oscillator, the Fock state |n⟩ of a harmonic one",
                    "|n⟩")
            .alias("fock")
            .keys(Key.count("level", 0, Long.MAX_VALUE, "3", "the level n, counted from 0"))
            .ways(Way.of("level"));

    private static final NounKind COHERENT = NounKind.of(
                    "coherent",
                    "coherent state",
                    "the state that swings like the classical oscillator and keeps its shape",
                    "|α⟩, α = √n̄ e^{iφ},  a|α⟩ = α|α⟩")
            .homes("harmonic")
            .keys(
                    Key.of("mean", Form.NUMBER, "9.5", "mean quanta n̄, any real number from 0")
                            .formula("n̄ = |α|²"),
                    Key.quantity(
                                    "phase",
                                    "phase φ of α at time 0; 0 starts at the turning point on the +x side",
                                    Kind.ANGLE)
                            .standard("0 deg"),
                    Key.of("alpha", Form.COMPLEX, "1.5+0.5i", "the amplitude α").formula("n̄ = |α|²"),
                    Key.quantity("displacement", "mean position at time 0", LENGTH)
                            .formula("⟨x⟩ = √2 ℓ Re α,  ℓ = √(ħ/mω)")
                            .standard("0 where a momentum is given"),
                    Key.quantity("momentum", "mean momentum at time 0", MOMENTUM)
                            .formula("⟨p⟩ = √2 (ħ/ℓ) Im α,  ℓ = √(ħ/mω)")
                            .standard("0 where a displacement is given"))
            .ways(
                    Way.of("mean").with("phase"),
                    Way.of("alpha"),
                    Way.of("displacement").with("momentum"),
                    Way.of("momentum").with("displacement"));

    private static final NounKind SUPERPOSITION = NounKind.of(
                    "superposition",
                    "superposition",
                    "several levels at once, each with its weight",
                    "Σ w_j |n_j⟩ / √(Σ |w_j|²)")
            .keys(
                    Key.of("levels", Form.COUNTS, "0 1 2", "the levels, counted from 0, each once"),
                    Key.of("weights", Form.COMPLEXES, "1 1i 0.5-0.2i", "weights of the levels, in the same order")
                            .formula("only their ratios count; the state is normalised")
                            .standard("all equal"))
            .ways(Way.of("levels").with("weights"));

    private static final NounKind GAUSSIAN = NounKind.of(
                    "gaussian",
                    "Gaussian packet",
                    "a packet thrown into a box or a well; what the bound levels cannot carry is refused",
                    "ψ ∝ exp(−(x − x₀)²/4Δx² + ip₀(x − x₀)/ħ),  ΔxΔp = ħ/2")
            .homes("box", "finite well")
            .keys(
                    Key.quantity("position", "mean position x₀, measured from the middle", LENGTH)
                            .standard("0, the middle"),
                    Key.quantity("momentum", "mean momentum p₀", MOMENTUM).standard("0, at rest"),
                    Key.quantity("spread", "standard deviation Δx of the position", LENGTH))
            .ways(Way.of("spread").with("position", "momentum"));

    /** Copies the nouns. */
    public Grammar {
        nouns = List.copyOf(nouns);
    }

    /**
     * The language of this version.
     *
     * @param observables what {@code table} can list
     */
    public static Grammar of(List<Item> observables) {
        return new Grammar(List.of(
                Noun.of(
                                "oscillator",
                                "oscillator NAME: KIND, KEY VALUE UNIT, …",
                                "oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz",
                                "declares an oscillator: what the system is")
                        .kinds(HARMONIC, BOX, FINITE_WELL),
                Noun.of(
                                "state",
                                "state NAME: KIND in OSCILLATOR, KEY VALUE, …",
                                "state psi: coherent in trap, mean 9.5, phase 30 deg",
                                "prepares a state: what the motion starts in")
                        .kinds(COHERENT, NUMBER, SUPERPOSITION, GAUSSIAN)
                        .lead(Key.reference(
                                "in", "oscillator", "trap", "the oscillator that the state is prepared in")),
                Noun.of(
                                "evolve",
                                "evolve NAME: STATE for DURATION, KEY VALUE, …",
                                "evolve run: psi for 3 periods, frames 120",
                                "lets a state move for a time")
                        .reference("state")
                        .lead(Key.quantity(
                                        "for",
                                        "how long; a period is the classical one at the mean energy of the state",
                                        PERIODS,
                                        TIME)
                                .called("duration"))
                        .keys(
                                Key.count("frames", 1, Long.MAX_VALUE, "120", "number of equal time steps to look at")
                                        .standard("120"),
                                Key.of(
                                                "tolerance",
                                                Form.NUMBER,
                                                "1e-9",
                                                "largest error of the state, between 1e-13 and 0.1")
                                        .formula("‖ψ − ψ̃‖ at every time")
                                        .standard("1e-9")),
                Noun.of(
                                "table",
                                "table RUN: OBSERVABLE, OBSERVABLE, …, every N, as NAME",
                                "table run: position, spread of position, energy, return probability",
                                "tabulates observables of a run, each with its ± and how sure it is")
                        .about("evolve")
                        .items(observables)
                        .keys(
                                Key.count(
                                                "every",
                                                1,
                                                Long.MAX_VALUE,
                                                "10",
                                                "keeps the first row and every N-th after it")
                                        .standard("1, every row"),
                                Key.of("as", Form.NEW_NAME, "motion", "keeps the table under a name, for Java cells")),
                Noun.of(
                                "animate",
                                "animate RUN, KEY VALUE",
                                "animate run",
                                "shows the moving density |ψ(x, t)|² of a run")
                        .about("evolve")
                        .keys(Key.count("points", 2, 100_000, "400", "number of grid points across the motion")
                                .standard("400")),
                Noun.of(
                                "levels",
                                "levels OSCILLATOR, KEY VALUE",
                                "levels well, count 5",
                                "tabulates the lowest levels of an oscillator")
                        .about("oscillator")
                        .keys(Key.count("count", 1, 10_000, "5", "how many levels, from the lowest")
                                .standard("10, or all bound levels where there are fewer"))));
    }

    /** The noun of that word, in any case. */
    public Optional<Noun> noun(String word) {
        String typed = Words.plain(word);
        return nouns.stream().filter(noun -> noun.word().equals(typed)).findFirst();
    }

    /** How messages call a thing that a noun declares: "an oscillator", "a state", "a run". */
    static String thing(String noun) {
        return switch (noun) {
            case "evolve" -> "a run";
            case "java" -> "a Java value of another type";
            default -> Words.article(noun);
        };
    }

    /**
     * Reads a sentence, its expressions included.
     *
     * @param text the text it stands in
     * @param sentence where it stands
     */
    public Sentence read(String text, Place sentence, Surroundings surroundings, Expressions expressions)
            throws MisreadSentence {
        if (isTooLong(sentence)) {
            throw new MisreadSentence(
                    "a sentence has at most " + LONGEST_SENTENCE + " characters, not "
                            + (sentence.end() - sentence.start()) + "; a long list can be given as a Java expression in"
                            + " braces",
                    new Place(sentence.start(), sentence.start()));
        }
        return new SentenceReader(this, text, sentence, surroundings, expressions).read();
    }

    /**
     * Reads a sentence without the values of its Java expressions, which are taken to be right: for finding mistakes before
     * anything is carried out. The sentence returned holds stand-ins for these values.
     */
    public Sentence check(String text, Place sentence, Surroundings surroundings) throws MisreadSentence {
        return read(text, sentence, surroundings, (expression, place) -> Values.UNKNOWN);
    }

    private static boolean isTooLong(Place sentence) {
        return sentence.end() - sentence.start() > LONGEST_SENTENCE;
    }

    /** What could stand at the cursor. */
    public Offers complete(SentenceText text, int cursor, Surroundings surroundings) {
        return isTooLong(text.at(cursor))
                ? Offers.none(Math.max(0, cursor))
                : new Completer(this, surroundings).at(text, cursor);
    }

    /** The word at the cursor, if there is one. */
    public Optional<String> wordAt(SentenceText text, int cursor) {
        Place place = text.at(cursor);
        if (isTooLong(place)) {
            return Optional.empty();
        }
        return Inspector.wordAt(Pieces.of(text.text(), place.start(), place.end()), cursor)
                .map(Piece::text);
    }

    /** What the word at the cursor means, if it is a word of the language; declared names are the caller's business. */
    public Optional<Explanation> explain(SentenceText text, int cursor) {
        return isTooLong(text.at(cursor)) ? Optional.empty() : new Inspector(this).at(text, cursor);
    }
}
