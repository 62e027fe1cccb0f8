package ladderwell.kernel.sentence;

import java.util.List;
import java.util.Optional;
import javax.lang.model.SourceVersion;
import ladderwell.kernel.sentence.Noun.Head;
import ladderwell.kernel.sentence.Piece.Sort;

/** Reads what opens a sentence: its marks, its noun, its name, its kind. */
record Opening(Grammar grammar, Place place, List<Piece> pieces, Outline outline) {

    void refuseLooseMarks() throws MisreadSentence {
        for (Piece piece : pieces) {
            Place mark = new Place(piece.place().start(), piece.place().start() + 1);
            if (piece.is(Sort.UNCLOSED)) {
                boolean brace = piece.text().startsWith("{");
                throw new MisreadSentence(
                        brace
                                ? "this brace is never closed; a Java expression ends with '}'"
                                : "this quote is never closed; a quotation ends with '\"' on the same line",
                        mark);
            }
            if (piece.is(Sort.STRAY)) {
                throw new MisreadSentence("this closing brace closes nothing; an expression starts with '{'", mark);
            }
        }
    }

    Noun noun() throws MisreadSentence {
        List<String> nouns = grammar.nouns().stream().map(Noun::word).toList();
        if (outline.nounPiece().isEmpty()) {
            throw new MisreadSentence(
                    "a sentence starts with a noun: " + Words.either(nouns), new Place(place.start(), place.start()));
        }
        Piece piece = outline.nounPiece().get();
        if (outline.noun().isEmpty()) {
            Optional<String> near = Words.nearest(piece.text(), nouns);
            throw new MisreadSentence(
                    Words.quoted(piece.typed()) + " is no noun; a sentence starts with " + Words.either(nouns)
                            + Words.didYouMean(near),
                    piece.place());
        }
        return outline.noun().get();
    }

    Piece name(Noun noun) throws MisreadSentence {
        Place nounPlace = outline.nounPiece().orElseThrow().place();
        String wanted = noun.declares() ? "a name" : "the name of " + Grammar.thing(noun.subject());
        List<Piece> subject = outline.subject();
        if (subject.isEmpty()) {
            throw new MisreadSentence(
                    wanted + " is missing after '" + noun.word() + "', as in '" + noun.example() + "'",
                    nounPlace.behind());
        }
        Piece name = subject.get(0);
        if (!name.is(Sort.WORD)) {
            throw new MisreadSentence(
                    "expected " + wanted + " after '" + noun.word() + "', not " + Words.quoted(name.typed()),
                    name.place());
        }
        checkColon(noun, name);
        if (noun.declares()) {
            checkIdentifier(name);
        }
        return name;
    }

    private void checkColon(Noun noun, Piece name) throws MisreadSentence {
        List<Piece> subject = outline.subject();
        String after = Words.quoted(name.typed());
        if (noun.head() == Head.NONE) {
            if (outline.colon().isPresent()) {
                throw new MisreadSentence(
                        noun.word() + " takes no colon; the form is '" + noun.pattern() + "'",
                        outline.colon().get().place());
            }
        } else if (outline.colon().isEmpty()) {
            throw new MisreadSentence(
                    "a colon is missing after " + after + "; the form is '" + noun.pattern() + "'",
                    subject.size() > 1 ? subject.get(1).place() : name.place().behind());
        } else if (subject.size() > 1) {
            throw new MisreadSentence(
                    "a name is one word; " + Words.quoted(subject.get(1).text()) + " is too much before the colon",
                    subject.get(1).place());
        }
    }

    static void checkIdentifier(Piece name) throws MisreadSentence {
        String text = name.text();
        if (text.length() > 200 || !SourceVersion.isIdentifier(text)) {
            throw new MisreadSentence(
                    Words.quoted(text)
                            + " cannot be a name; a name is made of letters, digits and _, starts with a letter,"
                            + (text.length() > 200 ? " and is no longer than 200 characters" : " and has no blanks"),
                    name.place());
        }
        if (SourceVersion.isKeyword(text)) {
            throw new MisreadSentence(
                    Words.quoted(text) + " cannot be a name, because it is a word of Java; take another", name.place());
        }
    }

    void checkHead(Noun noun) throws MisreadSentence {
        if (noun.head() == Head.NONE || noun.head() == Head.ITEMS) {
            return;
        }
        Place behindColon = outline.colon().orElseThrow().place().behind();
        if (noun.head() == Head.REFERENCE) {
            if (outline.head().isEmpty()) {
                throw new MisreadSentence(
                        "the name of " + Grammar.thing(noun.headNoun()) + " is missing after the colon", behindColon);
            }
            return;
        }
        if (outline.kind().isPresent()) {
            return;
        }
        List<String> kinds = noun.kinds().stream().map(NounKind::word).toList();
        String expected = "; kinds of " + noun.word() + " are " + Words.all(kinds);
        if (outline.head().isEmpty()) {
            throw new MisreadSentence("a kind is missing after the colon" + expected, behindColon);
        }
        List<Piece> head = outline.head();
        List<Piece> two = head.subList(0, Math.min(2, head.size()));
        Optional<String> nearTwo = Words.nearest(Outline.text(two), kinds);
        Optional<String> near = nearTwo.or(() -> Words.nearest(head.get(0).text(), kinds));
        List<Piece> wrong = nearTwo.isPresent() ? two : head.subList(0, 1);
        throw new MisreadSentence(
                Words.quoted(Outline.text(wrong)) + " is no kind of " + noun.word()
                        + (near.isPresent() ? Words.didYouMean(near) : expected),
                Outline.placeOf(wrong).orElse(behindColon));
    }
}
