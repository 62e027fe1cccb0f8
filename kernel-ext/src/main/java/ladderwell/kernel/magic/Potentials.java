package ladderwell.kernel.magic;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import ladderwell.Fact;
import ladderwell.MovingWell;
import ladderwell.Oscillator;
import ladderwell.PotentialWell;
import ladderwell.evidence.Bound;
import ladderwell.formula.Amount;
import ladderwell.formula.Formula;
import ladderwell.formula.FormulaException;
import ladderwell.formula.Parameters;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Place;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.potential.Potential;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import tech.tablesaw.api.Table;
import tech.tablesaw.io.csv.CsvReadOptions;

/** The oscillators whose sentence names a potential, by name, by formula or by a table of points. */
record Potentials(Sentence sentence) {
    private static final Pattern TIME = Pattern.compile("(?<![\\p{L}\\p{N}_])t(?![\\p{L}\\p{N}_])");

    /** Whether a formula speaks of the time, so that its potential moves. */
    static boolean moves(Sentence sentence) {
        return sentence.kind().equals("potential")
                && TIME.matcher(sentence.text("formula")).find();
    }

    Oscillator oscillator() throws MisreadSentence {
        if (sentence.kind().equals("potential")) {
            return fromFormula();
        }
        Potential potential = potential();
        double boundaryPhase = sentence.has("charge") ? 2 * Math.PI * sentence.number("charge") : 0;
        PotentialWell well = Oscillator.in(potential, boundaryPhase);
        return well.declared(sentence.kind(), formula(potential.text()), given());
    }

    private Potential potential() throws MisreadSentence {
        return switch (sentence.kind()) {
            case "quartic" ->
                sentence.has("frequency")
                        ? Potential.quartic(mass(), quantity("frequency"), amount("coefficient"))
                        : Potential.quartic(mass(), amount("coefficient"));
            case "sextic" -> Potential.sextic(mass(), amount("coefficient"));
            case "double well" -> Potential.doubleWell(mass(), quantity("separation"), quantity("barrier"));
            case "morse" -> morse();
            case "poschl-teller" -> Potential.poschlTeller(mass(), quantity("depth"), quantity("width"));
            case "pendulum" ->
                Potential.pendulum(
                        mass(),
                        sentence.natural() ? Quantity.of(1, Units.ONE) : quantity("arm"),
                        quantity("frequency"));
            case "lattice" -> Potential.lattice(mass(), quantity("depth"), quantity("wavelength"));
            case "junction" -> Potential.junction(quantity("charging"), quantity("josephson"));
            case "linear with wall" -> Potential.linearWithWall(mass(), amount("force"));
            case "lennard-jones" ->
                Potential.lennardJones(
                        mass(),
                        quantity("depth"),
                        quantity("sigma"),
                        sentence.has("repulsion") ? (int) sentence.count("repulsion") : 12,
                        sentence.has("attraction") ? (int) sentence.count("attraction") : 6);
            case "tabulated" -> Potential.tabulated(mass(), points());
            default -> throw new IllegalStateException("no potential is made of kind " + sentence.kind());
        };
    }

    private Quantity mass() {
        return sentence.natural() ? Quantity.of(1, Units.ONE) : quantity("mass");
    }

    private Quantity quantity(String key) {
        return sentence.quantity(key);
    }

    private Amount amount(String key) {
        return sentence.amount(key);
    }

    private Potential morse() {
        if (sentence.has("range")) {
            return Potential.morse(mass(), quantity("depth"), amount("range"));
        }
        return Potential.morseFromLevels(
                mass(), quantity(sentence.has("wavenumber") ? "wavenumber" : "frequency"), quantity("anharmonicity"));
    }

    private Oscillator fromFormula() throws MisreadSentence {
        String text = sentence.text("formula");
        Parameters parameters = Parameters.none();
        for (String name : sentence.parameters()) {
            try {
                parameters = parameters.with(name, sentence.amount(name));
            } catch (IllegalArgumentException e) {
                throw new MisreadSentence(String.valueOf(e.getMessage()), sentence.placeOf(name), e);
            }
        }
        Quantity mass = mass();
        if (!parameters.values().containsKey("m")) {
            parameters = parameters.with("m", mass);
        }
        Formula formula;
        try {
            formula = sentence.natural() ? Formula.natural(text, parameters) : Formula.potential(text, parameters);
        } catch (FormulaException e) {
            throw new MisreadSentence(e.reason(), inside(e), e);
        }
        for (String name : sentence.parameters()) {
            if (!formula.parameters().contains(name)) {
                throw new MisreadSentence(
                        "the formula does not use '" + name + "', and it is no key of a potential; a formula's"
                                + " parameters are the names that stand in it"
                                + (formula.parameters().isEmpty()
                                        ? ""
                                        : ", here " + String.join(", ", formula.parameters())),
                        sentence.placeOf(name));
            }
        }
        try {
            return in(formula, mass);
        } catch (FormulaException e) {
            throw new MisreadSentence(e.reason(), inside(e), e);
        } catch (IllegalArgumentException e) {
            throw new MisreadSentence(String.valueOf(e.getMessage()), sentence.placeOf("formula"), e);
        }
    }

    private Oscillator in(Formula formula, Quantity mass) throws MisreadSentence {
        boolean walls = sentence.has("left") || sentence.has("right");
        String wall = sentence.has("left") ? "left" : "right";
        String shown = formula(formula.text());
        if (!sentence.has("scale") && !formula.dependsOnTime()) {
            return Oscillator.in(Potential.of(formula, mass, end("left"), end("right")))
                    .declared("potential", shown, given());
        }
        if (walls) {
            throw new MisreadSentence(
                    "a wall does not go with a potential that "
                            + (formula.dependsOnTime() ? "moves" : "is said to be open by 'scale'")
                            + "; leave '" + wall + "' out",
                    sentence.placeOf(wall));
        }
        Oscillator oscillator = sentence.has("scale")
                ? Oscillator.open(formula, mass, quantity("scale"))
                : Oscillator.in(formula, mass);
        return oscillator instanceof MovingWell moving
                ? moving.declared("potential", shown, given())
                : ((PotentialWell) oscillator).declared("potential", shown, given());
    }

    private double end(String side) {
        double open = side.equals("left") ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        return sentence.has(side) ? quantity(side).si() : open;
    }

    /** The place of a mistake in a formula; the whole value where it came from an expression. */
    private Place inside(FormulaException e) {
        return inside(sentence, e);
    }

    static Place inside(Sentence sentence, FormulaException e) {
        Place value = sentence.placeOf("formula");
        boolean typed = value.end() - value.start() == e.text().length() + 2;
        int start = value.start() + 1 + e.start();
        return typed ? new Place(start, Math.max(start + 1, value.start() + 1 + e.end())) : value;
    }

    private Table points() throws MisreadSentence {
        String name = sentence.text("file");
        Path path = Path.of(name);
        if (!Files.isRegularFile(path)) {
            throw new MisreadSentence(
                    "there is no file '" + name + "' in the notebook's folder; expected one of comma separated values",
                    sentence.placeOf("file"));
        }
        try {
            return Table.read().csv(CsvReadOptions.builder(path.toFile()).build());
        } catch (RuntimeException e) {
            throw new MisreadSentence(
                    "the file '" + name + "' cannot be read as comma separated values: " + e.getMessage(),
                    sentence.placeOf("file"),
                    e);
        }
    }

    /** The potential in one line, with what was typed and is no quantity of a common kind. */
    private String formula(String potential) {
        boolean named = !sentence.kind().equals("potential") && !sentence.kind().equals("tabulated");
        StringBuilder words = new StringBuilder(named ? sentence.kindFormula() : potential);
        for (String key : List.of("coefficient", "range", "force", "repulsion", "attraction")) {
            if (sentence.has(key)) {
                words.append(", ").append(key).append(' ').append(sentence.typed(key));
            }
        }
        for (String name : sentence.parameters()) {
            words.append(", ").append(name).append(" = ").append(sentence.typed(name));
        }
        for (String side : List.of("left", "right")) {
            if (sentence.has(side)) {
                words.append(", wall on the ").append(side).append(" at ").append(sentence.typed(side));
            }
        }
        if (sentence.has("charge")) {
            words.append(", offset charge ").append(sentence.typed("charge"));
        }
        return words.toString();
    }

    private List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        for (String key : List.of(
                "mass",
                "frequency",
                "wavenumber",
                "anharmonicity",
                "depth",
                "width",
                "separation",
                "barrier",
                "arm",
                "wavelength",
                "charging",
                "josephson",
                "sigma",
                "left",
                "right",
                "scale")) {
            if (sentence.has(key)) {
                given.add(new Fact(key, symbol(key), quantity(key), Bound.exact()));
            }
        }
        return given;
    }

    private static String symbol(String key) {
        return switch (key) {
            case "mass" -> "m";
            case "wavenumber" -> "ωₑ";
            case "anharmonicity" -> "ωₑxₑ";
            case "depth" -> "D";
            case "width" -> "w";
            case "separation" -> "s";
            case "barrier" -> "B";
            case "arm" -> "r";
            case "wavelength" -> "λ";
            case "charging" -> "E_C";
            case "josephson" -> "E_J";
            case "sigma" -> "σ";
            default -> "";
        };
    }
}
