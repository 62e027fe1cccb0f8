package ladderwell.formula;

import java.util.ArrayList;
import java.util.List;

/**
 * A piece of a formula with its place.
 *
 * @param kind what it is
 * @param text as it counts: − is "-", · and × are "*", ≤ is "&lt;="
 * @param start first character, from 0
 * @param end one past the last character
 */
record Token(Kind kind, String text, int start, int end) {

    enum Kind {
        NUMBER,
        NAME,
        MARK,
        END
    }

    boolean is(String mark) {
        return kind != Kind.NUMBER && kind != Kind.END && text.equals(mark);
    }

    static boolean isName(String text) {
        if (text.isEmpty() || !isNameStart(text.charAt(0))) {
            return false;
        }
        for (int i = 1; i < text.length(); i++) {
            if (!isNamePart(text.charAt(i))) {
                return false;
            }
        }
        return true;
    }

    static List<Token> read(String text) {
        List<Token> tokens = new ArrayList<>();
        int i = 0;
        while (i < text.length()) {
            char c = text.charAt(i);
            if (Character.isWhitespace(c) || c == '\u00a0') {
                i++;
                continue;
            }
            int end;
            if (isDigit(c) || c == '.') {
                end = numberEnd(text, i);
                tokens.add(new Token(Kind.NUMBER, text.substring(i, end), i, end));
            } else if (isNameStart(c)) {
                end = i + 1;
                while (end < text.length() && isNamePart(text.charAt(end))) {
                    end++;
                }
                // the dagger belongs to the one letter that carries it
                if (c == 'a' && end == i + 1 && end < text.length() && text.charAt(end) == '†') {
                    end++;
                }
                tokens.add(new Token(Kind.NAME, text.substring(i, end), i, end));
            } else {
                end = i + (c == '<' || c == '>' ? equalsAfter(text, i) : 1);
                tokens.add(new Token(Kind.MARK, mark(text, c, i, end), i, end));
            }
            i = end;
        }
        tokens.add(new Token(Kind.END, "", text.length(), text.length()));
        return tokens;
    }

    private static int equalsAfter(String text, int i) {
        return i + 1 < text.length() && text.charAt(i + 1) == '=' ? 2 : 1;
    }

    private static String mark(String text, char c, int start, int end) {
        return switch (c) {
            case '+', '-', '*', '/', '^', '(', ')', ',' -> String.valueOf(c);
            case '−' -> "-";
            case '·', '×' -> "*";
            case '<', '>' -> text.substring(start, end);
            case '≤' -> "<=";
            case '≥' -> ">=";
            case '²', '³' ->
                throw new FormulaException(
                        "a power is written with ^, such as x^" + (c == '²' ? 2 : 3), text, start, end);
            case '=' ->
                throw new FormulaException("conditions compare with <, <=, > or >=, not with =", text, start, end);
            case '[', '{', ']', '}' ->
                throw new FormulaException("only round brackets ( ) group a formula", text, start, end);
            default -> {
                int code = text.codePointAt(start);
                throw new FormulaException(
                        "'" + new String(Character.toChars(code)) + "' has no place in a formula",
                        text,
                        start,
                        start + Character.charCount(code));
            }
        };
    }

    private static int numberEnd(String text, int start) {
        int i = start;
        boolean digits = false;
        boolean point = false;
        while (i < text.length() && (isDigit(text.charAt(i)) || text.charAt(i) == '.')) {
            if (text.charAt(i) == '.') {
                if (point) {
                    throw new FormulaException("a number has one decimal point", text, start, i + 1);
                }
                point = true;
            } else {
                digits = true;
            }
            i++;
        }
        if (!digits) {
            throw new FormulaException("a point needs digits, such as 0.5", text, start, i);
        }
        if (i < text.length() && (text.charAt(i) == 'e' || text.charAt(i) == 'E')) {
            int j = i + 1;
            if (j < text.length() && (text.charAt(j) == '-' || text.charAt(j) == '+' || text.charAt(j) == '−')) {
                j++;
            }
            if (j < text.length() && isDigit(text.charAt(j))) {
                while (j < text.length() && isDigit(text.charAt(j))) {
                    j++;
                }
                return j;
            }
        }
        return i;
    }

    private static boolean isDigit(char c) {
        return c >= '0' && c <= '9';
    }

    private static boolean isNameStart(char c) {
        return Character.isLetter(c) || c == '_' || c == '°';
    }

    private static boolean isNamePart(char c) {
        return Character.isLetter(c) || isDigit(c) || c == '_' || c == '\u030a';
    }
}
