package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.PERIODS;
import static ladderwell.quantity.Kind.TIME;

import java.util.List;
import java.util.Optional;

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
                        .kinds(OscillatorKinds.all()),
                Noun.of(
                                "state",
                                "state NAME: KIND in OSCILLATOR, KEY VALUE, …",
                                "state psi: coherent in trap, mean 9.5, phase 30 deg",
                                "prepares a state: what the motion starts in")
                        .kinds(StateKinds.all())
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
                                        .formula("‖ψ − ψ̃‖ of a vector, ‖ρ − ρ̃‖₁ of a density operator, at every time")
                                        .standard("1e-9; 1e-6 for a mode that jumps")),
                Noun.of(
                                "plan",
                                "plan STATE for DURATION, KEY VALUE, …",
                                "plan psi for 3 periods",
                                "says how an evolution would be computed, how large and how long, before it runs")
                        .about("state")
                        .lead(Key.quantity("for", "how long, as in evolve", PERIODS, TIME)
                                .called("duration"))
                        .keys(
                                Key.count("frames", 1, Long.MAX_VALUE, "120", "number of equal time steps to look at")
                                        .standard("120"),
                                Key.of(
                                                "tolerance",
                                                Form.NUMBER,
                                                "1e-9",
                                                "largest error of the state, between 1e-13 and 0.1")
                                        .standard("as in evolve")),
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
                                "phasespace",
                                "phasespace RUN at INSTANT, KEY",
                                "phasespace run at 1.5 periods",
                                "shows the Wigner function W(x, p) of a run at an instant, or moving below its density")
                        .about("evolve")
                        .lead(Key.quantity(
                                        "at",
                                        "when; a period is the classical one at the mean energy of the state",
                                        PERIODS,
                                        TIME)
                                .called("instant")
                                .standard("the whole run, as a film"))
                        .keys(Key.of(
                                "husimi",
                                Form.FLAG,
                                "",
                                "shows the Husimi function instead, the mean over coherent states")),
                Noun.of(
                                "levels",
                                "levels OSCILLATOR, KEY VALUE",
                                "levels well, count 5",
                                "tabulates the lowest levels of an oscillator")
                        .about("oscillator")
                        .keys(Key.count("count", 1, 10_000, "5", "how many levels, from the lowest")
                                .standard("10, or all bound levels where there are fewer")),
                Noun.of(
                                "elements",
                                "elements OSCILLATOR: COUPLING, COUPLING, …, levels N N N, as NAME",
                                "elements well: position, momentum, \"x^2\", levels 0..4",
                                "tabulates transition elements ⟨m|A|n⟩ between levels of an oscillator")
                        .about("oscillator")
                        .items(couplings())
                        .keys(
                                Key.of("levels", Form.COUNTS, "0..4", "the levels, counted from 0, each once")
                                        .standard("0..4, or all bound levels where there are fewer"),
                                Key.of(
                                        "as",
                                        Form.NEW_NAME,
                                        "dipoles",
                                        "keeps the table under a name, for Java cells"))));
    }

    private static List<Item> couplings() {
        return List.of(
                new Item("position", false, "x", "a length", "⟨m|x|n⟩, dipole transitions", "coupling", false),
                new Item(
                        "momentum",
                        false,
                        "p",
                        "a momentum",
                        "the imaginary part of ⟨m|p|n⟩; its real part is 0",
                        "coupling",
                        false),
                new Item(
                        "a function of x",
                        false,
                        "f(x)",
                        "what f measures",
                        "⟨m|f(x)|n⟩ of a formula in quotes, such as \"x^2\" or \"cos(2*x/nm)\"",
                        "coupling",
                        true));
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
