namespace FtEstimate.Reports.Writers;

/// <summary>The style sheet of the page.</summary>
internal static class PageStyle
{
    /// <summary>Plain and calm; tables scroll sideways on a phone, nothing is torn apart in print.</summary>
    public const string Css = """
        :root { --ink: #1d2329; --quiet: #56616c; --line: #d5dae0; --tint: #f4f6f8; --mark: #2b5c8a; }
        * { box-sizing: border-box; }
        body { margin: 0; background: #fff; color: var(--ink); font: 16px/1.55 "Helvetica Neue", Helvetica, Arial, "Liberation Sans", sans-serif; }
        main { max-width: 54rem; margin: 0 auto; padding: 1.5rem 1.25rem 4rem; overflow-wrap: break-word; }
        h1 { font-size: 1.65rem; line-height: 1.25; margin: 0.5rem 0 0; }
        h2 { font-size: 1.25rem; margin: 2.5rem 0 0.5rem; padding-bottom: 0.25rem; border-bottom: 2px solid var(--mark); }
        section:first-of-type h2 { margin-top: 1.25rem; }
        p, ul { margin: 0.75rem 0; max-width: 46rem; }
        ul { padding-left: 1.2rem; }
        li { margin: 0.3rem 0; }
        blockquote { margin: 1rem 0; padding: 0.1rem 1rem; border-left: 4px solid #b4552d; background: #fbf3ef; }
        code { font: 0.86em/1.4 "DejaVu Sans Mono", Consolas, monospace; }
        .wide { overflow-x: auto; margin: 1rem 0; }
        table { border-collapse: collapse; font-size: 0.9rem; line-height: 1.4; font-variant-numeric: tabular-nums; }
        th, td { padding: 0.32rem 0.7rem; border-bottom: 1px solid var(--line); vertical-align: top; text-align: left; }
        th { background: var(--tint); border-bottom: 1px solid #9aa5b1; vertical-align: bottom; }
        td[style*="right"] { white-space: nowrap; }
        figure { margin: 1.25rem 0; }
        figure svg { display: block; width: 100%; max-width: 760px; height: auto; }
        figcaption { font-size: 0.88rem; color: var(--quiet); margin-top: 0.35rem; max-width: 46rem; }
        @media (max-width: 40rem) {
          body { font-size: 15px; }
          main { padding: 0.75rem 0.9rem 3rem; }
          h1 { font-size: 1.35rem; }
          figure { overflow-x: auto; }
          figure svg { min-width: 34rem; }
          td, th { min-width: 4.5rem; }
        }
        @media print {
          @page { margin: 18mm 16mm; }
          body { font-size: 10pt; color: #000; }
          main { max-width: none; padding: 0; }
          .wide { overflow: visible; }
          h2 { break-after: avoid; }
          figure, blockquote, li, tr { break-inside: avoid; }
          thead { display: table-header-group; }
          th { background: #fff; }
        }

        """;
}
