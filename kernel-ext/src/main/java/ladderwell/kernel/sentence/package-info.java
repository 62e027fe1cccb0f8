/**
 * The language of declarations: text → typed sentence, and from the same table completion and help.
 *
 * <p>A sentence reads {@code NOUN NAME: KIND [in NAME], KEY VALUE [UNIT], KEY VALUE [UNIT], …}; the order after the kind is
 * free, commas part the entries. What may stand where is written once, in {@link ladderwell.kernel.sentence.Grammar};
 * nothing here knows what a sentence does, that is the business of {@code ladderwell.kernel.magic}.
 *
 * <p>Where sentences stand (see {@link ladderwell.kernel.sentence.SentenceText}): on a line that starts with {@code %},
 * or in a cell that starts with {@code %%declare}, one a line, without the {@code %}. In such a cell a sentence goes on in
 * the next line when that line is indented deeper than the one on which the sentence began; it ends at a blank line, and
 * where the next line reads {@code NOUN NAME:}, however that is indented.
 * {@code #} starts a comment anywhere outside braces and quotes. {@code {…}} holds a Java expression, wherever a value can
 * stand; braces nest, and those in Java strings do not count.
 *
 * <p>Words of the language may be typed in any case; names and units are taken as they stand. Numbers are written as
 * {@code 9.5}, {@code -3} or {@code 1e8}, complex ones as {@code 1.5+0.5i}, {@code 2i}, {@code -i}; the minus sign − is
 * as good as the hyphen.
 *
 * <p>Reading order: {@link ladderwell.kernel.sentence.Grammar} with {@link ladderwell.kernel.sentence.Noun}, {@link
 * ladderwell.kernel.sentence.NounKind}, {@link ladderwell.kernel.sentence.Key} and {@link
 * ladderwell.kernel.sentence.Item} (the table), {@link ladderwell.kernel.sentence.SentenceText} (which stretch of text is
 * a sentence), {@code Pieces}, {@code Outline} and {@code SentenceReader} (text → {@link
 * ladderwell.kernel.sentence.Sentence}), {@code Completer} and {@code Inspector}. A mistake is a {@link
 * ladderwell.kernel.sentence.MisreadSentence}: one sentence and the {@link ladderwell.kernel.sentence.Place} it speaks of.
 */
@NullMarked
package ladderwell.kernel.sentence;

import org.jspecify.annotations.NullMarked;
