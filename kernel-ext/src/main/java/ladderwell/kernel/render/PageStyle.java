package ladderwell.kernel.render;

/** The little style that cards and tables add to the page's own. */
final class PageStyle {
    /** Names and words at the left, numbers at the right with figures of equal width; lighter ink for what is secondary. */
    static final String ELEMENT = "<style>"
            + ".lw-sheet{max-width:100%;overflow-x:auto;margin:2px 0 8px}"
            + ".lw-sheet .lw-head{font-weight:600;margin:0 0 3px}"
            + ".lw-sheet .lw-verdict{margin:0 0 4px}"
            + ".lw-sheet .lw-pm,.lw-sheet .lw-symbol,.lw-sheet .lw-sure,.lw-sheet .lw-error{opacity:.62}"
            + ".lw-sheet .lw-sure{font-size:85%;margin-left:.35em;cursor:help}"
            + ".lw-sheet .lw-error{font-size:12.5px;margin:3px 0 0;font-variant-numeric:tabular-nums}"
            + ".lw-sheet table.lw-table{margin:0;width:auto;border-collapse:collapse;font-variant-numeric:tabular-nums}"
            + ".lw-sheet table.lw-table td,.lw-sheet table.lw-table th{padding:2px 14px 2px 0;text-align:left;white-space:nowrap;"
            + "vertical-align:baseline}"
            + ".lw-sheet table.lw-table th{font-weight:600;border-bottom:1px solid;border-color:inherit}"
            + ".lw-sheet table.lw-table .lw-number{text-align:right}"
            + ".lw-sheet table.lw-table th.lw-pm{font-weight:400}"
            + ".lw-sheet .lw-symbol{margin-left:.6em}"
            + "</style>\n";

    private PageStyle() {}
}
